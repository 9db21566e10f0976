/**
 * Undo and redo by snapshots. Snapshots are whole immutable values that share what did not change,
 * so two hundred steps of a document cost little.
 */
import { computed, shallowRef, type ComputedRef, type ShallowRef } from 'vue'

export interface HistoryOptions {
  /** Steps kept. @default 200 */
  capacity?: number
}

export interface History<T> {
  /** The value in force; replaced whole, never mutated. */
  current: Readonly<ShallowRef<T>>
  canUndo: ComputedRef<boolean>
  canRedo: ComputedRef<boolean>
  /** `now` makes an undo step; `later` belongs to a step that a following `now` closes (a drag). */
  apply(value: T, commit: 'now' | 'later'): void
  undo(): void
  redo(): void
  /** Starts over from a value, with nothing to undo. */
  reset(value: T): void
}

export function useHistory<T>(initial: T, options: HistoryOptions = {}): History<T> {
  const { capacity = 200 } = options
  const current = shallowRef(initial) as ShallowRef<T>
  /** Value of the last closed step; `current` differs from it while a drag goes on. */
  let settled = initial
  const past = shallowRef<T[]>([])
  const future = shallowRef<T[]>([])

  function apply(value: T, commit: 'now' | 'later') {
    current.value = value
    if (commit === 'later' || value === settled) return
    past.value = [...past.value, settled].slice(-capacity)
    future.value = []
    settled = value
  }

  function undo() {
    const previous = past.value.at(-1)
    if (previous === undefined) return
    future.value = [settled, ...future.value]
    past.value = past.value.slice(0, -1)
    settled = previous
    current.value = previous
  }

  function redo() {
    const [next, ...rest] = future.value
    if (next === undefined) return
    past.value = [...past.value, settled]
    future.value = rest
    settled = next
    current.value = next
  }

  function reset(value: T) {
    past.value = []
    future.value = []
    settled = value
    current.value = value
  }

  return {
    current,
    canUndo: computed(() => past.value.length > 0),
    canRedo: computed(() => future.value.length > 0),
    apply,
    undo,
    redo,
    reset,
  }
}
