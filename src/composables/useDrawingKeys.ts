/** The keyboard on a section drawing: Tab goes from part to part and then on, other keys edit what is selected. */
import type { Ref } from 'vue'
import type { Section } from '#shared/document/analysisDocument.ts'
import { findKeyEdit } from '@/drawing/keyEdit.ts'
import { isSame, listSelectable, type Selection } from '@/drawing/selection.ts'

interface DrawingKeysOptions {
  section: () => Section
  selection: Ref<Selection | null>
  /** The selected part goes without those that are kept alike with it. */
  alone: Ref<boolean>
  edit: (section: Section) => void
}

export function useDrawingKeys({ section, selection, alone, edit }: DrawingKeysOptions) {
  function press(event: KeyboardEvent) {
    if (event.key === 'Tab') return cycle(event)
    if (event.key === 'Escape') {
      selection.value = null
      return
    }
    if (!selection.value || event.ctrlKey || event.metaKey) return
    if (event.key === 'a' || event.key === 'A') {
      alone.value = !alone.value
      return
    }
    const edited = findKeyEdit(section(), selection.value, event, alone.value)
    if (!edited) return
    event.preventDefault()
    edit(edited)
  }

  /** Past the last part, or before the first one, the focus leaves the drawing. */
  function cycle(event: KeyboardEvent) {
    const parts = listSelectable(section())
    const at = parts.findIndex((part) => isSame(part, selection.value))
    const next = at === -1 ? (event.shiftKey ? -1 : 0) : at + (event.shiftKey ? -1 : 1)
    const part = parts[next]
    selection.value = part ?? null
    if (part) event.preventDefault()
  }

  return { press }
}
