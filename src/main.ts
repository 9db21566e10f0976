import '@fontsource/roboto/latin-400.css'
import '@fontsource/roboto/latin-400-italic.css'
import '@fontsource/roboto/latin-500.css'
import '@fontsource/roboto/latin-ext-400.css'
import '@fontsource/roboto/latin-ext-500.css'
import '@fontsource/roboto/greek-400.css'
import '@fontsource/roboto/greek-400-italic.css'
import '@fontsource/roboto-mono/latin-400.css'
import '@fontsource/roboto-mono/latin-500.css'
import { createPinia } from 'pinia'
import { createApp } from 'vue'
import App from './App.vue'
import { vuetify } from '@/plugins/vuetify.ts'
import { createAppRouter } from '@/router/router.ts'
import '@/styles/tokens.css'
import '@/styles/main.css'

const app = createApp(App)
app.use(createPinia())
app.use(vuetify)
app.use(createAppRouter())
app.mount('#app')
