import { computed } from 'vue'
import { useTheme } from 'vuetify'

export type ThemeName = 'light' | 'dark'

const key = 'girdwell:theme'

/** What the person chose before, else what the system prefers. */
export function findKeptTheme(): ThemeName {
  const kept = globalThis.localStorage?.getItem(key)
  if (kept === 'light' || kept === 'dark') return kept
  return globalThis.matchMedia?.('(prefers-color-scheme: dark)').matches ? 'dark' : 'light'
}

/** The theme in force and the switch to the other one, kept for the next visit. */
export function useThemeChoice() {
  const theme = useTheme()
  const name = computed<ThemeName>(() => (theme.global.current.value.dark ? 'dark' : 'light'))
  const other = computed<ThemeName>(() => (name.value === 'dark' ? 'light' : 'dark'))
  function switchTheme() {
    localStorage.setItem(key, other.value)
    theme.change(other.value)
  }
  return { name, other, switchTheme }
}
