import type { JobRole, OfficeRole } from '#shared/api.ts'

export interface DemoAccount {
  name: string
  initials: string
  email: string
  role: OfficeRole
  /** Role in every demo job; null: none, as the administrator sees them all. */
  jobRole: JobRole | null
}

/** Invented people. The top-level domain `invalid` (RFC 2606) belongs to nobody and receives no mail. */
export const demoAccounts: DemoAccount[] = [
  account('Lena Brandvold', 'LB', 'administrator', null),
  account('Rosa Marchetti', 'RM', 'member', 'designer'),
  account('Tomas Ekholm', 'TE', 'member', 'designer'),
  account('Kofi Oduya', 'KO', 'member', 'checker'),
  account('Mara Lindqvist', 'ML', 'member', 'viewer'),
]

/** Of all demo accounts. It is printed at start, which is why the server then listens to this machine only. */
export const demoPassword = 'spiral-and-core'

function account(name: string, initials: string, role: OfficeRole, jobRole: JobRole | null): DemoAccount {
  const [first] = name.toLowerCase().split(' ')
  return { name, initials, email: `${first}@demo.girdwell.invalid`, role, jobRole }
}
