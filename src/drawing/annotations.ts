/** Everything written round and on a section, placed so that no words lie on others. px, y down. */
import type { Section } from '#shared/document/analysisDocument.ts'
import { placeBars } from '#shared/geometry/bars.ts'
import { groupAlike, type SpiralGroup } from '@/editing/spiralGroups.ts'
import { placeCallouts, type Callout, type HeldCallouts, type Slot, type Target } from './callouts.ts'
import { createChamferNote, type ChamferNote } from './chamferNote.ts'
import { createCompressedArrow, type CompressedArrow } from './compressedSide.ts'
import { listCompactNotes } from './compactNotes.ts'
import { keepNumbersClear, type DimensionLine } from './dimensionLines.ts'
import { diagramWidth, type DrawingFrame } from './drawingFrame.ts'
import { computeBarRadius, computeWireWidth, handleSize, listHandles } from './grips.ts'
import type { NeutralAxis } from './neutralAxis.ts'
import { measureLines, type NoteLine, type NoteRequest } from './noteLines.ts'
import { listOverlaps } from './overlaps.ts'
import { writePart, writeSpiralSize } from './partWords.ts'
import { createSectionDimensions, createSelectionDimensions } from './sectionDimensions.ts'
import type { Selection } from './selection.ts'
import { formatSize } from './size.ts'
import { placeSpiralLabels, type LabelOffsets, type SpiralLabel } from './spiralLabels.ts'
import { createTextBox, type Box } from './textBox.ts'

export interface Note extends Callout {
  lines: NoteLine[]
}

export interface Annotations {
  dimensions: DimensionLine[]
  arrow: CompressedArrow | null
  chamfer: ChamferNote | null
  labels: SpiralLabel[]
  notes: Note[]
  tag: Note | null
}

export interface AnnotationOptions {
  section: Section
  frame: DrawingFrame
  angle: number
  /** Half of the compressed face on which the arrow stands. */
  arrowSide: 1 | -1
  offsets: LabelOffsets
  selection: Selection | null
  neutralAxis: NeutralAxis | null
  /** Boxes of the hint on the selected part. */
  hint: readonly Box[]
  held?: HeldCallouts
}

export const tagHeight = 22
export const tagPadding = 9
const mostOverlaps = 2
const mostGroups = 4

export function createAnnotations(options: AnnotationOptions): Annotations {
  const { section, frame, angle, arrowSide, offsets, selection, neutralAxis, hint, held } = options
  const labels = frame.compact ? [] : placeSpiralLabels(section, frame.view, offsets)
  const shownLabels = labels.filter(({ id }) => selection?.kind !== 'spiral' || selection.id !== id)
  const arrow = frame.compact ? null : createCompressedArrow(section.outline, frame.view, angle, arrowSide)
  const chamfer = frame.compact ? null : createChamferNote(section.outline, frame, angle)
  const fixed = createSectionDimensions(section, frame)
  const coverAtRight = fixed.some((line) => line.key === 'cover' && line.textX > frame.right)
  const chosen =
    selection?.kind === 'spiral' ? createSelectionDimensions(section, selection.id, frame, coverAtRight) : []
  const dimensions = keepNumbersClear([...fixed, ...chosen], arrow?.boxes.slice(1))

  const requests = frame.compact
    ? listCompactNotes(section, frame.view)
    : listNotes(section, frame, labels, selection)
  const tag = selection ? createTagRequest(section, frame, selection) : null
  const boxes = [
    ...dimensions.map((line) => line.box),
    ...(arrow?.boxes ?? []),
    ...(chamfer ? [chamfer.box] : []),
    ...shownLabels.map((label) => label.box),
    ...hint,
  ]
  const callouts = placeCallouts(
    [...(tag && !frame.compact ? [tag] : []), ...requests],
    listSlots(frame),
    { left: 6, top: 6, right: frame.width - 6, bottom: frame.height - 4 },
    {
      boxes,
      areas: [...listAreas(frame, neutralAxis), ...dimensions.map((line) => line.span)],
      bars: listRounds(section, frame, selection),
    },
    held,
  )
  const lines = new Map([...(tag ? [tag] : []), ...requests].map((one) => [one.key, one.lines]))
  const notes = callouts.map((callout) => ({ ...callout, lines: lines.get(callout.key) ?? [] }))
  return {
    dimensions,
    arrow,
    chamfer,
    labels: shownLabels,
    notes: notes.filter((note) => note.key !== 'tag'),
    tag: tag && frame.compact ? createCornerTag(tag) : (notes.find((note) => note.key === 'tag') ?? null),
  }
}

/** A narrow drawing has no room for a leader: its tag stands in the corner. */
function createCornerTag({ key, lines, width, height }: NoteRequest): Note {
  return {
    key,
    lines,
    box: { left: 8, top: 8, right: 8 + width, bottom: 8 + height },
    slot: { left: 8, top: 8, side: 'left' },
    target: 0,
    turn: 0,
    leader: '',
    end: { kind: 'dot', x: 8, y: 8, ux: 0, uy: 0 },
  }
}

/** Sizes of spirals that are not written inside, and overlaps. */
function listNotes(
  section: Section,
  frame: DrawingFrame,
  labels: readonly SpiralLabel[],
  selection: Selection | null,
): NoteRequest[] {
  const sized = new Set(labels.filter((label) => label.lines.length > 0).map((label) => label.id))
  const groups = groupAlike(section.spirals)
    .filter(({ members }) => !members.every(({ id }) => sized.has(id)))
    .filter(({ members }) => !members.some(({ id }) => selection?.kind === 'spiral' && selection.id === id))
    .slice(0, mostGroups)
    .map((group) => createGroupNote(group, frame))
  const overlaps = listOverlaps(section.spirals)
    .slice(0, mostOverlaps)
    .map(({ depth, places }, i) => {
      const lines = [
        { strong: '', text: 'overlap' },
        { strong: '', text: formatSize(Math.round(depth)) },
      ]
      const targets = places.map(([x, y]): Target => ({
        kind: 'dot',
        x: frame.view.x(x),
        y: frame.view.y(y),
      }))
      return { key: `overlap-${i}`, lines, ...measureLines(lines), targets }
    })
  return [...groups, ...overlaps]
}

function createGroupNote({ name, members }: SpiralGroup, frame: DrawingFrame): NoteRequest {
  const lines = [{ strong: name, text: writeSpiralSize(members[0]) }]
  return {
    key: `group-${name}`,
    lines,
    ...measureLines(lines),
    targets: members.map((spiral): Target => ({
      kind: 'edge',
      x: frame.view.x(spiral.centre[0]),
      y: frame.view.y(spiral.centre[1]),
      radius: (spiral.diameter / 2) * frame.view.scale + computeWireWidth(spiral.barDiameter, frame.view) / 2,
    })),
  }
}

function createTagRequest(section: Section, frame: DrawingFrame, selection: Selection): NoteRequest | null {
  const words = writePart(section, selection)
  if (!words) return null
  const lines = [{ strong: words.name, text: words.size }]
  const { width } = measureLines(lines)
  return {
    key: 'tag',
    lines,
    width: width + 2 * tagPadding,
    height: tagHeight,
    targets: listSelectedTargets(section, frame, selection),
  }
}

function listSelectedTargets(section: Section, frame: DrawingFrame, selection: Selection): Target[] {
  const { view } = frame
  if (selection.kind === 'spiral') {
    return section.spirals
      .filter(({ id }) => id === selection.id)
      .map(({ centre, diameter }) => ({
        kind: 'edge',
        x: view.x(centre[0]),
        y: view.y(centre[1]),
        radius: (diameter / 2) * view.scale + 2,
      }))
  }
  return placeBars(section.bars)
    .filter(({ group }) => group === selection.group)
    .map((bar) => ({
      kind: 'edge',
      x: view.x(bar.x),
      y: view.y(bar.y),
      radius: computeBarRadius(bar.diameter, view) + 1.5,
    }))
}

/** Above the section, in the gap to its right, and below what stands beside it; compact: the column at the right. */
function listSlots(frame: DrawingFrame): Slot[] {
  const slots: Slot[] = []
  if (frame.compact) {
    for (let top = frame.top - 4; top < frame.bottom + 20; top += 6) {
      slots.push({ left: frame.right + 30, top, side: 'left' })
    }
    return slots
  }
  for (const top of [8, 26, 44]) {
    for (let left = 8; left < frame.width; left += 12) {
      slots.push({ left, top, side: 'left' }, { left, top, side: 'right' })
    }
  }
  for (let top = frame.top - 10; top < frame.bottom; top += 10) {
    slots.push({ left: frame.right + frame.bands.right + 24, top, side: 'left' })
    slots.push({ left: frame.right + frame.bands.right + 40, top, side: 'left' })
  }
  for (const top of [24, 36, 48, 62]) {
    for (let left = frame.right + 16; left < frame.width; left += 12) {
      slots.push({ left, top: frame.bottom + top, side: 'left' })
    }
    for (let left = 8; left < frame.left; left += 12) {
      slots.push({ left, top: frame.bottom + top, side: 'right' })
    }
  }
  return slots
}

/** Where no words may stand: the section, its rows of dimensions, the strain diagram, the key. */
function listAreas(frame: DrawingFrame, neutralAxis: NeutralAxis | null): Box[] {
  if (frame.compact) return [{ left: 0, top: frame.top, right: frame.right, bottom: frame.height }]
  const areas: Box[] = [
    {
      left: frame.left - 4,
      top: frame.top - 6,
      right: frame.right + 8,
      bottom: frame.bottom + frame.bands.bottom + 56,
    },
    { left: 0, top: frame.top - 6, right: frame.left, bottom: frame.bottom + 50 },
    // The caption.
    {
      left: (frame.left + frame.right) / 2 - 120,
      top: frame.bottom + frame.bands.bottom + 56,
      right: (frame.left + frame.right) / 2 + 120,
      bottom: frame.height,
    },
  ]
  if (frame.keyLeft !== null) {
    areas.push({ left: frame.keyLeft - 8, top: frame.top, right: frame.width, bottom: frame.bottom + 30 })
  }
  if (frame.diagramLeft !== null) {
    areas.push({
      left: frame.diagramLeft,
      top: frame.top - 12,
      right: frame.diagramLeft + diagramWidth,
      bottom: frame.bottom + 30,
    })
  }
  if (neutralAxis) {
    areas.push(createTextBox('N.A.', neutralAxis.textX, neutralAxis.textY, 16, 'text', neutralAxis.anchor))
  }
  return areas
}

/** Bars and handles, which leaders should not run through. */
function listRounds(
  section: Section,
  frame: DrawingFrame,
  selection: Selection | null,
): { x: number; y: number; radius: number }[] {
  const bars = placeBars(section.bars).map((bar) => ({
    x: frame.view.x(bar.x),
    y: frame.view.y(bar.y),
    radius: computeBarRadius(bar.diameter, frame.view),
  }))
  const handles = listHandles(section, frame.view, selection).map(({ x, y }) => ({
    x,
    y,
    radius: handleSize,
  }))
  return [...bars, ...handles]
}
