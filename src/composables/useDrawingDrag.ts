/**
 * Dragging parts of a section: every step is computed from the section as it was when the drag began, so that nothing
 * accumulates; steps are sent once a frame; the end makes one undo step, Escape goes back to the beginning.
 */
import { useEventListener } from '@vueuse/core'
import { onScopeDispose, ref, type Ref } from 'vue'
import type { Point, Section } from '#shared/document/analysisDocument.ts'
import type { Grip } from '@/components/section/drawing/HandleLayer.vue'
import { resizeRing, turnRing } from '@/drawing/edits/ringEdits.ts'
import { moveSpiral, resizeSpiral } from '@/drawing/edits/spiralEdits.ts'
import { findMirrorPartners } from '@/drawing/mirrorPartners.ts'
import type { Selection } from '@/drawing/selection.ts'
import { snapCentre, snapLength } from '@/drawing/snapping.ts'
import type { ViewTransform } from '@/drawing/viewTransform.ts'

export interface DrawingDrag {
  active: Ref<boolean>
  /** Why the part rests where it does. */
  reason: Ref<string>
  start(grip: Grip, event: PointerEvent, svg: SVGSVGElement): void
  move(event: PointerEvent): void
  end(event: PointerEvent): void
  giveUp(): void
}

interface DrawingDragOptions {
  section: () => Section
  view: () => ViewTransform
  select: (selection: Selection) => void
  edit: (section: Section, commit: 'later' | 'now') => void
}

/** px within which a snap catches */
const snapReach = 8
/** px a pointer must travel before it is a drag and not a click */
const slack = 3

export function useDrawingDrag({ section, view, select, edit }: DrawingDragOptions): DrawingDrag {
  const active = ref(false)
  const reason = ref('')
  let grip: Grip | null = null
  let before: Section | null = null
  let svg: SVGSVGElement | null = null
  let startedAt: Point = [0, 0]
  let startedMm: Point = [0, 0]
  let moved = false
  let latest: { place: Point; free: boolean; turn: boolean } | null = null
  let frame = 0

  function start(taken: Grip, event: PointerEvent, element: SVGSVGElement) {
    if (event.button !== 0) return
    event.preventDefault()
    element.focus({ preventScroll: true })
    element.setPointerCapture(event.pointerId)
    grip = taken
    svg = element
    before = section()
    startedAt = [event.clientX, event.clientY]
    startedMm = toMm(event)
    moved = false
    reason.value = ''
    select(taken.kind === 'ring' ? { kind: 'bars', group: taken.group } : { kind: 'spiral', id: taken.id })
  }

  function move(event: PointerEvent) {
    if (!grip) return
    if (!moved && Math.hypot(event.clientX - startedAt[0], event.clientY - startedAt[1]) < slack) return
    moved = true
    active.value = true
    latest = { place: toMm(event), free: event.altKey, turn: event.shiftKey }
    if (frame === 0) frame = requestAnimationFrame(step)
  }

  function step() {
    frame = 0
    const next = compute()
    if (next) edit(next, 'later')
  }

  function end(event: PointerEvent) {
    if (!grip) return
    if (moved) {
      latest = { place: toMm(event), free: event.altKey, turn: event.shiftKey }
      const next = compute()
      if (next) edit(next, 'now')
    }
    finish()
  }

  function giveUp() {
    if (grip && moved && before) edit(before, 'later')
    finish()
  }

  function finish() {
    cancelAnimationFrame(frame)
    frame = 0
    grip = null
    before = null
    latest = null
    active.value = false
    reason.value = ''
  }

  /** The section with the part where the pointer is now. */
  function compute(): Section | null {
    if (!grip || !before || !latest) return null
    const { place, free, turn } = latest
    if (grip.kind === 'ring') return computeRing(before, grip.group, place, free, turn)
    const { id } = grip
    const spiral = before.spirals.find((one) => one.id === id)
    if (!spiral) return null
    const partners = free ? [] : findMirrorPartners(before.spirals, id)
    const alike = partners.length > 0 ? 'kept alike' : ''
    if (grip.kind === 'resize-spiral') {
      const radius = Math.hypot(place[0] - spiral.centre[0], place[1] - spiral.centre[1])
      reason.value = alike
      return resizeSpiral(before, id, snapLength(2 * radius, free), partners)
    }
    const wanted: Point = [
      spiral.centre[0] + place[0] - startedMm[0],
      spiral.centre[1] + place[1] - startedMm[1],
    ]
    const snapped = snapCentre(wanted, spiral, before.outline, snapReach / view().scale, free)
    reason.value = [snapped.reason, alike].filter(Boolean).join(', ')
    return moveSpiral(before, id, snapped.point, partners)
  }

  function computeRing(
    from: Section,
    group: number,
    place: Point,
    free: boolean,
    turn: boolean,
  ): Section | null {
    const layout = from.bars[group]?.layout
    if (layout?.kind !== 'ring') return null
    const dx = place[0] - layout.centre[0]
    const dy = place[1] - layout.centre[1]
    if (turn) {
      const startedAngle = Math.atan2(startedMm[1] - layout.centre[1], startedMm[0] - layout.centre[0])
      const by = ((Math.atan2(dy, dx) - startedAngle) * 180) / Math.PI
      reason.value = 'turning'
      return turnRing(from, group, layout.startAngle + by)
    }
    reason.value = free ? 'free' : ''
    return resizeRing(from, group, snapLength(2 * Math.hypot(dx, dy), free))
  }

  function toMm(event: PointerEvent): Point {
    const box = svg?.getBoundingClientRect()
    return view().toMm(event.clientX - (box?.left ?? 0), event.clientY - (box?.top ?? 0))
  }

  useEventListener(globalThis.window, 'keydown', (event: KeyboardEvent) => {
    if (event.key === 'Escape' && grip) {
      event.stopPropagation()
      giveUp()
    }
  })
  onScopeDispose(finish)

  return { active, reason, start, move, end, giveUp }
}
