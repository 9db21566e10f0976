import 'vuetify/styles'
import { createVuetify, type ThemeDefinition } from 'vuetify'
import { aliases, mdi } from 'vuetify/iconsets/mdi-svg'
import { findKeptTheme } from '@/composables/useThemeChoice.ts'

/** Vuetify's names for the tokens of tokens.css; hexadecimal, since Vuetify computes shades of them. */
const light: ThemeDefinition = {
  dark: false,
  colors: {
    background: '#F7F4EC',
    surface: '#FFFDF8',
    primary: '#1F5A52',
    secondary: '#4E585D',
    error: '#B3261E',
    warning: '#7A5A06',
    success: '#2E6B3A',
    'on-primary': '#FFFDF8',
    'on-background': '#1E2529',
    'on-surface': '#1E2529',
  },
  variables: { 'high-emphasis-opacity': 1, 'medium-emphasis-opacity': 0.85, 'border-color': '#1E2529' },
}

const dark: ThemeDefinition = {
  dark: true,
  colors: {
    background: '#11171A',
    surface: '#182024',
    primary: '#86CDBD',
    secondary: '#C2BFB2',
    error: '#F58F85',
    warning: '#E8C36C',
    success: '#8FCB9A',
    'on-primary': '#0F1F1C',
    'on-background': '#EEE8DA',
    'on-surface': '#EEE8DA',
  },
  variables: { 'high-emphasis-opacity': 1, 'medium-emphasis-opacity': 0.85, 'border-color': '#EEE8DA' },
}

export const vuetify = createVuetify({
  theme: { defaultTheme: findKeptTheme(), themes: { light, dark } },
  icons: { defaultSet: 'mdi', aliases, sets: { mdi } },
  defaults: {
    VBtn: { rounded: 'sm', ripple: false, flat: true },
    VCard: { flat: true, rounded: 0 },
    VTextField: { variant: 'underlined', density: 'compact', color: 'primary' },
    VTextarea: { variant: 'underlined', density: 'compact', color: 'primary' },
    VSelect: { variant: 'underlined', density: 'compact', color: 'primary' },
    VTabs: { color: 'primary', density: 'compact' },
    VCheckbox: { color: 'primary', density: 'compact' },
    VDialog: { scrim: true, transition: false },
    VMenu: { transition: false },
  },
})
