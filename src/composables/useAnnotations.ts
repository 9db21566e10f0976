/**
 * What is written on a section drawing. While something is dragged, names and leaders keep their places beside what they
 * are about, and what goes along stays what it was when the drag began.
 */
import { computed, shallowRef, watch, type ComputedRef, type Ref } from 'vue'
import type { Section } from '#shared/document/analysisDocument.ts'
import type { DrawingDrag } from '@/composables/useDrawingDrag.ts'
import { createAnnotations, type Annotations } from '@/drawing/annotations.ts'
import type { Callout } from '@/drawing/callouts.ts'
import type { DrawingFrame } from '@/drawing/drawingFrame.ts'
import type { NeutralAxis } from '@/drawing/neutralAxis.ts'
import { writePart } from '@/drawing/partWords.ts'
import type { Selection } from '@/drawing/selection.ts'
import { createHint, type SelectionHint } from '@/drawing/selectionHint.ts'
import { computeLabelOffsets, type LabelOffsets } from '@/drawing/spiralLabels.ts'

interface AnnotationsOptions {
  section: () => Section
  angle: () => number
  frame: ComputedRef<DrawingFrame>
  neutralAxis: ComputedRef<NeutralAxis | null>
  selection: ComputedRef<Selection | null>
  drag: DrawingDrag
  /** Chosen for the selected part, beside what the drag says. */
  alone: Ref<boolean>
}

interface Held {
  section: Section
  offsets: LabelOffsets
  callouts: Map<string, Callout>
  arrowSide: 1 | -1
}

export function useAnnotations(options: AnnotationsOptions): {
  annotations: ComputedRef<Annotations>
  hint: ComputedRef<SelectionHint | null>
} {
  const { section, angle, frame, neutralAxis, selection, drag, alone } = options
  const held = shallowRef<Held | null>(null)

  /** The arrow leaves room for the dimension of a spiral that lies left. */
  const arrowSide = computed(() => {
    if (held.value) return held.value.arrowSide
    const chosen = selection.value
    if (chosen?.kind !== 'spiral') return -1
    return (section().spirals.find(({ id }) => id === chosen.id)?.centre[0] ?? 0) < 0 ? 1 : -1
  })
  const hint = computed(() => {
    const chosen = selection.value
    const words = chosen && writePart(held.value?.section ?? section(), chosen)
    if (!words) return null
    const reason = drag.active.value ? drag.reason.value : ''
    return createHint(section(), chosen, words, alone.value || drag.alone.value, reason, frame.value)
  })
  const offsets = computed(() => held.value?.offsets ?? computeLabelOffsets(section(), frame.value.view))
  const annotations = computed(() =>
    createAnnotations({
      section: section(),
      frame: frame.value,
      angle: angle(),
      arrowSide: arrowSide.value,
      offsets: offsets.value,
      selection: selection.value,
      neutralAxis: neutralAxis.value,
      hint: hint.value?.boxes ?? [],
      held: held.value?.callouts,
    }),
  )

  function hold(): Held {
    const { notes, tag } = annotations.value
    const callouts = tag ? [...notes, tag] : notes
    return {
      section: section(),
      offsets: offsets.value,
      callouts: new Map(callouts.map((callout) => [callout.key, callout])),
      arrowSide: arrowSide.value,
    }
  }
  // Before the first step of the drag changes the section.
  watch(drag.active, (active) => (held.value = active ? hold() : null), { flush: 'sync' })

  return { annotations, hint }
}
