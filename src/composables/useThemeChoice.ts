import { computed, ref, watchEffect } from 'vue'
import { useTheme } from 'vuetify'

export type ThemeName = 'light' | 'dark'
/** A theme chosen by the person, or whatever the system has at the time. */
export type ThemeChoice = ThemeName | 'system'

const key = 'girdwell:theme'

/** What the person chose before, else to follow the system. */
export function findKeptTheme(): ThemeChoice {
  try {
    const kept = globalThis.localStorage?.getItem(key)
    return kept === 'light' || kept === 'dark' ? kept : 'system'
  } catch {
    // Storage is switched off in this browser: the system's theme is a fair answer.
    return 'system'
  }
}

/** The choice in force, and the way to change it; a chosen theme is kept for the next visit. */
export function useThemeChoice() {
  const theme = useTheme()
  const choice = ref<ThemeChoice>(findKeptTheme())
  const other = computed<ThemeName>(() => (theme.global.current.value.dark ? 'light' : 'dark'))

  function choose(chosen: ThemeChoice) {
    choice.value = chosen
    theme.change(chosen)
    try {
      if (chosen === 'system') localStorage.removeItem(key)
      else localStorage.setItem(key, chosen)
    } catch {
      // It holds until the page is left, which is all that a browser without storage can do.
      return
    }
  }
  return { choice, other, choose }
}

/** The ground behind the page (over-scroll, gaps while loading) takes the theme in force. */
export function useThemeOfDocument(): void {
  const theme = useTheme()
  watchEffect(() => {
    const dark = theme.global.current.value.dark
    document.documentElement.classList.toggle('v-theme--dark', dark)
    document.documentElement.classList.toggle('v-theme--light', !dark)
  })
}
