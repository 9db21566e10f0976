import { createPinia } from 'pinia'
import { createApp } from 'vue'
import App from './App.vue'
import { vuetify } from '@/plugins/vuetify.ts'
import { createAppRouter } from '@/router/router.ts'
import '@/styles/fonts.css'
import '@/styles/tokens.css'
import '@/styles/main.css'

const app = createApp(App)
app.use(createPinia())
app.use(vuetify)
app.use(createAppRouter())
app.mount('#app')
