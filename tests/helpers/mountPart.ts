import { mount, type VueWrapper } from '@vue/test-utils'
import { createPinia } from 'pinia'
import { h, type Component } from 'vue'
import { createVuetify } from 'vuetify'
import { VApp } from 'vuetify/components'
import { aliases, mdi } from 'vuetify/iconsets/mdi-svg'
import { createMemoryHistory, createRouter } from 'vue-router'

/** A part of the page as it stands in the application: theme and stores round it. */
export function mountPart(part: Component, props: Record<string, unknown> = {}): VueWrapper {
  const vuetify = createVuetify({ icons: { defaultSet: 'mdi', aliases, sets: { mdi } } })
  // Links have somewhere to point to; where they lead is not the part's business.
  const router = createRouter({
    history: createMemoryHistory(),
    routes: [{ path: '/:rest(.*)*', component: { render: () => null } }],
  })
  return mount(
    { render: () => h(VApp, null, { default: () => h(part, props) }) },
    {
      attachTo: document.body,
      global: { plugins: [createPinia(), vuetify, router] },
    },
  )
}
