import type { CalloutRequest } from './callouts.ts'
import { estimateTextWidth } from './textBox.ts'

/** A line of words outside the section: a name in medium, and what is said of it. */
export interface NoteLine {
  strong: string
  text: string
}

export interface NoteRequest extends CalloutRequest {
  lines: NoteLine[]
}

/** px */
export const noteSize = 12
export const noteLineHeight = 17
/** Between the name and the rest. */
export const noteGap = 6

export function measureLines(lines: readonly NoteLine[]): { width: number; height: number } {
  const widths = lines.map(({ strong, text }) => {
    const gap = strong !== '' && text !== '' ? noteGap : 0
    return estimateTextWidth(strong, noteSize + 0.5, 'text') + gap + estimateTextWidth(text, noteSize, 'text')
  })
  return { width: Math.max(...widths), height: lines.length * noteLineHeight }
}
