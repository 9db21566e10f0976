/**
 * Dragging parts of a section. Steps are sent once a frame with `later`; the end sends one `now`; Escape, or a pointer
 * that is taken away, sends the section as it was before and nothing after it.
 */
import { useEventListener } from '@vueuse/core'
import { onScopeDispose, readonly, ref, type Ref } from 'vue'
import type { Point, Section } from '#shared/document/analysisDocument.ts'
import { computeDragStep } from '@/drawing/dragStep.ts'
import type { Grip } from '@/drawing/selection.ts'
import type { ViewTransform } from '@/drawing/viewTransform.ts'

export interface DrawingDrag {
  active: Readonly<Ref<boolean>>
  /** The part goes alone, without those that are kept alike with it. */
  alone: Readonly<Ref<boolean>>
  /** Why the part rests where it does. */
  reason: Readonly<Ref<string>>
  start(grip: Grip, event: PointerEvent, svg: SVGSVGElement): void
  move(event: PointerEvent): void
  end(event: PointerEvent): void
  giveUp(): void
}

interface DrawingDragOptions {
  section: () => Section
  view: () => ViewTransform
  /** Chosen for the part; Alt does the same for as long as it is held. */
  alone: () => boolean
  edit: (section: Section, commit: 'later' | 'now') => void
}

/** px within which a snap catches */
const snapReach = 5
/** px a pointer must travel before it is a drag and not a click */
const slack = 3

interface Held {
  grip: Grip
  before: Section
  svg: SVGSVGElement
  pointer: number
  client: Point
  from: Point
  to: Point
  free: boolean
  turn: boolean
}

export function useDrawingDrag({ section, view, alone: isAlone, edit }: DrawingDragOptions): DrawingDrag {
  const active = ref(false)
  const alone = ref(false)
  const reason = ref('')
  let held: Held | null = null
  let frame = 0

  function start(grip: Grip, event: PointerEvent, svg: SVGSVGElement) {
    if (held || event.button !== 0) return
    svg.setPointerCapture(event.pointerId)
    const from = toMm(svg, event)
    held = {
      grip,
      before: section(),
      svg,
      pointer: event.pointerId,
      client: [event.clientX, event.clientY],
      from,
      to: from,
      free: false,
      turn: false,
    }
    reason.value = ''
  }

  function move(event: PointerEvent) {
    if (!held || event.pointerId !== held.pointer) return
    const travelled = Math.hypot(event.clientX - held.client[0], event.clientY - held.client[1])
    if (!active.value && travelled < slack) return
    active.value = true
    held.to = toMm(held.svg, event)
    take(event)
    schedule()
  }

  function take(keys: { altKey: boolean; ctrlKey: boolean; metaKey: boolean; shiftKey: boolean }) {
    if (!held) return
    alone.value = keys.altKey || isAlone()
    held.free = keys.ctrlKey || keys.metaKey
    held.turn = keys.shiftKey
  }

  function schedule() {
    if (frame === 0) frame = requestAnimationFrame(step)
  }

  function step() {
    frame = 0
    send('later')
  }

  function send(commit: 'later' | 'now') {
    if (!held) return
    const { grip, before, from, to, free, turn } = held
    const reach = snapReach / view().scale
    const next = computeDragStep({ before, grip, from, to, reach, alone: alone.value, free, turn })
    reason.value = next.reason
    edit(next.section, commit)
  }

  function end(event: PointerEvent) {
    if (!held || event.pointerId !== held.pointer) return
    if (active.value) {
      held.to = toMm(held.svg, event)
      take(event)
      send('now')
    }
    finish()
  }

  function giveUp() {
    if (held && active.value) {
      reason.value = ''
      edit(held.before, 'later')
    }
    finish()
  }

  function finish() {
    cancelAnimationFrame(frame)
    frame = 0
    held = null
    active.value = false
    alone.value = false
  }

  function toMm(svg: SVGSVGElement, event: PointerEvent): Point {
    const box = svg.getBoundingClientRect()
    return view().toMm(event.clientX - box.left, event.clientY - box.top)
  }

  // Before the drawing's own keys: during a drag Escape belongs to it, and a key that changes it acts at once.
  function heedKey(event: KeyboardEvent) {
    if (!held) return
    if (event.key === 'Escape' && event.type === 'keydown') {
      event.stopPropagation()
      giveUp()
    } else if (active.value && ['Alt', 'Shift', 'Control', 'Meta'].includes(event.key)) {
      // Alt alone would open the menu of the browser.
      event.preventDefault()
      take(event)
      schedule()
    }
  }
  useEventListener(globalThis.window, ['keydown', 'keyup'], heedKey, { capture: true })
  onScopeDispose(finish)

  return {
    active: readonly(active),
    alone: readonly(alone),
    reason: readonly(reason),
    start,
    move,
    end,
    giveUp,
  }
}
