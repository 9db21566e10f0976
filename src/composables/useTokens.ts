import { nextTick, shallowRef, watch, type ShallowRef } from 'vue'
import { useTheme } from 'vuetify'

const names = ['ink', 'ink2', 'ink3', 'rule', 'grid', 'ghost', 'spruce', 'surface'] as const
export type Tokens = Record<(typeof names)[number], string>

/** Colours of tokens.css for what is painted on a canvas, read anew when the theme changes. */
export function useTokens(): Readonly<ShallowRef<Tokens>> {
  const theme = useTheme()
  const tokens = shallowRef(readTokens())
  watch(
    () => theme.global.name.value,
    () => nextTick(() => (tokens.value = readTokens())),
    { immediate: true },
  )
  return tokens
}

function readTokens(): Tokens {
  const style = getComputedStyle(document.querySelector('.v-application') ?? document.documentElement)
  return Object.fromEntries(
    names.map((name) => [name, style.getPropertyValue(`--${name}`).trim() || '#000000']),
  ) as Tokens
}
