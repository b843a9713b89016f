import 'server-only'
import { fileTypeFromBuffer } from 'file-type'
import sharp from 'sharp'
import { ok, refuse, type Result } from '@/lib/core/result'

/** What a file really is, and its bytes as they are kept. Pictures are drawn anew: nothing of what came along stays. */
export type Media = {
  kind: 'picture' | 'sound' | 'document'
  mediaType: string
  content: Buffer
  widthPx: number | null
  heightPx: number | null
}

type Refusal = 'empty_file' | 'picture_with_script' | 'too_many_pixels' | 'picture_broken' | 'unknown_kind'

/** Wider pictures are made narrower: no screen shows more. */
const MOST_WIDE = 2400
const QUALITY = 82
const PICTURES = /^image\/(png|jpeg|webp|gif|avif|tiff|heic)$/
const SOUNDS: Readonly<Record<string, string>> = {
  'audio/mpeg': 'audio/mpeg',
  'audio/ogg': 'audio/ogg',
  'audio/opus': 'audio/ogg',
  'audio/wav': 'audio/wav',
  'audio/vnd.wave': 'audio/wav',
  'audio/flac': 'audio/flac',
  'audio/x-flac': 'audio/flac',
  'audio/mp4': 'audio/mp4',
  'audio/x-m4a': 'audio/mp4',
}

/**
 * Looks at the bytes of a file, whatever it is called: a picture, a sound or a document, or none we take.
 * Refuses: empty_file · picture_with_script (SVG, which may carry one) · too_many_pixels · picture_broken · unknown_kind.
 */
export async function readMedia(content: Buffer, mostPixels: number): Promise<Result<Media, Refusal>> {
  if (content.length === 0) return refuse('empty_file')
  const mime = (await fileTypeFromBuffer(content))?.mime ?? ''
  if (isSvg(content, mime)) return refuse('picture_with_script')
  if (PICTURES.test(mime)) return readPicture(content, mostPixels)
  const sound = SOUNDS[mime.split(';')[0] ?? '']
  const plain = { content, widthPx: null, heightPx: null }
  if (sound) return ok({ kind: 'sound', mediaType: sound, ...plain })
  if (mime === 'application/pdf') return ok({ kind: 'document', mediaType: mime, ...plain })
  return refuse('unknown_kind')
}

function isSvg(content: Buffer, mime: string): boolean {
  const begin = content.subarray(0, 2000).toString('utf8')
  return mime === 'image/svg+xml' || /<svg[\s>]/i.test(begin)
}

async function readPicture(content: Buffer, mostPixels: number): Promise<Result<Media, Refusal>> {
  try {
    // The size is read from the head, before anything is unpacked.
    const { width = 0, height = 0 } = await sharp(content, { limitInputPixels: false }).metadata()
    if (width * height > mostPixels) return refuse('too_many_pixels')
    const { data, info } = await sharp(content, { limitInputPixels: mostPixels })
      .rotate()
      .resize({ width: MOST_WIDE, withoutEnlargement: true })
      .webp({ quality: QUALITY })
      .toBuffer({ resolveWithObject: true })
    return ok({
      kind: 'picture',
      mediaType: 'image/webp',
      content: data,
      widthPx: info.width,
      heightPx: info.height,
    })
  } catch {
    return refuse('picture_broken')
  }
}
