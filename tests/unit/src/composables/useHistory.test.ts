import { describe, expect, it } from 'vitest'
import { useHistory } from '@/composables/useHistory.ts'

describe('useHistory', () => {
  it('walks back and forth through committed values', () => {
    const history = useHistory('a')
    history.apply('b', 'now')
    history.apply('c', 'now')
    history.undo()
    expect(history.current.value).toBe('b')
    history.undo()
    expect(history.current.value).toBe('a')
    expect(history.canUndo.value).toBe(false)
    history.redo()
    history.redo()
    expect(history.current.value).toBe('c')
    expect(history.canRedo.value).toBe(false)
  })

  it('makes one step of a drag, however many moves it had', () => {
    const history = useHistory(0)
    for (let step = 1; step < 30; step++) history.apply(step, 'later')
    history.apply(30, 'now')
    expect(history.current.value).toBe(30)
    history.undo()
    expect(history.current.value).toBe(0)
    expect(history.canUndo.value).toBe(false)
  })

  it('makes no step of a drag that was given up', () => {
    const history = useHistory('before')
    history.apply('during', 'later')
    history.apply('before', 'later')
    expect(history.canUndo.value).toBe(false)
    history.apply('before', 'now')
    expect(history.canUndo.value).toBe(false)
  })

  it('forgets what was undone when something new is done', () => {
    const history = useHistory('a')
    history.apply('b', 'now')
    history.undo()
    history.apply('c', 'now')
    expect(history.canRedo.value).toBe(false)
    history.undo()
    expect(history.current.value).toBe('a')
  })

  it('keeps as many steps as its capacity, the newest ones', () => {
    const history = useHistory(0, { capacity: 3 })
    for (let value = 1; value <= 10; value++) history.apply(value, 'now')
    let steps = 0
    while (history.canUndo.value) {
      history.undo()
      steps += 1
    }
    expect(steps).toBe(3)
    expect(history.current.value).toBe(7)
  })

  it('keeps two hundred steps unless told otherwise', () => {
    const history = useHistory(0)
    for (let value = 1; value <= 250; value++) history.apply(value, 'now')
    let steps = 0
    while (history.canUndo.value) {
      history.undo()
      steps += 1
    }
    expect(steps).toBe(200)
  })

  it('does nothing on undo and redo when there is nothing to do', () => {
    const history = useHistory('only')
    history.undo()
    history.redo()
    expect(history.current.value).toBe('only')
  })
})
