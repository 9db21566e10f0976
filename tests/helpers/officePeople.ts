import type { Job, JobRole, Member, SectionSummary, User } from '#shared/api.ts'

/** Invented people and their job, as the API tells of them. */
export const rosa: User = {
  id: '7c1f0d1e-52a8-4f0b-9d58-0c8d2a4f1a01',
  name: 'Rosa Marchetti',
  initials: 'RM',
  email: 'rosa@demo.girdwell.invalid',
  role: 'member',
  active: true,
}
export const lena: User = {
  ...rosa,
  id: '7c1f0d1e-52a8-4f0b-9d58-0c8d2a4f1a02',
  name: 'Lena Brandvold',
  initials: 'LB',
  email: 'lena@demo.girdwell.invalid',
  role: 'administrator',
}

export const jobId = '3b0b0d1e-52a8-4f0b-9d58-0c8d2a4f1b01'

export function makeJob(role: JobRole | null, changes: Partial<Job> = {}): Job {
  return {
    id: jobId,
    title: 'Tern Creek Crossing',
    number: 'TCC-2026',
    revision: 3,
    createdAt: Date.UTC(2026, 10, 2, 9, 0),
    role,
    sectionCount: 1,
    changedAt: Date.UTC(2026, 10, 24, 14, 32),
    ...changes,
  }
}

export const rosaAsDesigner: Member = {
  userId: rosa.id,
  name: rosa.name,
  initials: rosa.initials,
  email: rosa.email,
  role: 'designer',
}

export const pier3: SectionSummary = {
  id: '5d0b0d1e-52a8-4f0b-9d58-0c8d2a4f1c01',
  jobId,
  title: 'Pier 3 column, five spirals',
  revision: 4,
  changedAt: Date.UTC(2026, 10, 24, 14, 32),
  changedBy: rosa.name,
  sheetCount: 2,
}
