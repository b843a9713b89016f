/** Something on a front panel; millimetres from its top left corner to the centre. */
export type FrontPanelControl = {
  kind: 'knob' | 'jack' | 'switch' | 'button' | 'light' | 'slider' | 'display'
  label: string
  xMm: number
  yMm: number
  /** Diameter, or the longer side; millimetres. */
  sizeMm: number
}

export type SpecificationLine = { name: string; value: string }
