import { classNames } from './class-names'

export type ButtonKind = 'primary' | 'secondary' | 'destructive' | 'plain'

const shape =
  'inline-flex min-h-11 items-center justify-center gap-2 rounded px-5 py-2 text-center text-17 font-semibold no-underline bench:min-h-14 bench:px-7 print:hidden forced-border'
const looks: Record<ButtonKind, string> = {
  primary: 'bg-tide text-paper border border-tide hover:bg-ink hover:border-ink',
  secondary: 'border border-ink text-ink hover:bg-ink hover:text-paper',
  destructive: 'bg-rust text-paper border border-rust hover:bg-ink hover:border-ink',
  plain: 'px-2 text-tide underline underline-offset-4 decoration-1 hover:decoration-2',
}

/** The classes of a button, for the rare element that must look like one. */
export function buttonClass(kind: ButtonKind = 'primary', wide = false): string {
  return classNames(shape, looks[kind], wide && 'w-full')
}

type ButtonProps = React.ComponentProps<'button'> & { kind?: ButtonKind; wide?: boolean }

/** A deed. Submits its form unless told otherwise; its words name the deed. */
export function Button({ kind, wide, className, type = 'submit', ...rest }: ButtonProps) {
  return (
    <button
      type={type}
      className={classNames(
        buttonClass(kind, wide),
        'disabled:cursor-not-allowed disabled:opacity-60',
        className,
      )}
      {...rest}
    />
  )
}

type LinkButtonProps = React.ComponentProps<'a'> & { href: string; kind?: ButtonKind; wide?: boolean }

/** A way to somewhere that weighs as much as a button; it changes nothing by itself. */
export function LinkButton({ kind = 'secondary', wide, className, ...rest }: LinkButtonProps) {
  return <a className={classNames(buttonClass(kind, wide), className)} {...rest} />
}

/** Buttons side by side, one under the other where it is narrow. */
export function ButtonRow({ children }: { children: React.ReactNode }) {
  return (
    <div className="flex flex-col items-stretch gap-3 sm:flex-row sm:flex-wrap sm:items-center print:hidden">
      {children}
    </div>
  )
}
