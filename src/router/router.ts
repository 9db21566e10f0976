import { createRouter, createWebHistory, type RouteRecordRaw, type RouterHistory } from 'vue-router'
import { useSessionStore } from '@/stores/session.ts'

declare module 'vue-router' {
  interface RouteMeta {
    /** Words for the title of the window. */
    title: string
    /** Open to everybody. */
    public?: boolean
    /** Only for administrators of the office. */
    administrator?: boolean
  }
}

const routes: RouteRecordRaw[] = [
  { path: '/', redirect: '/jobs' },
  {
    path: '/sign-in',
    name: 'sign-in',
    component: () => import('@/views/SignInView.vue'),
    meta: { title: 'Sign in', public: true },
  },
  { path: '/jobs', name: 'jobs', component: () => import('@/views/JobsView.vue'), meta: { title: 'Jobs' } },
  {
    path: '/jobs/:jobId',
    name: 'job',
    component: () => import('@/views/JobView.vue'),
    meta: { title: 'Job' },
  },
  {
    path: '/sections/:sectionId',
    name: 'section',
    component: () => import('@/views/SectionView.vue'),
    meta: { title: 'Section' },
  },
  {
    path: '/sheets/:sheetId',
    name: 'sheet',
    component: () => import('@/views/SheetView.vue'),
    meta: { title: 'Calculation sheet' },
  },
  {
    path: '/link/:token',
    name: 'link',
    component: () => import('@/views/LinkView.vue'),
    meta: { title: 'Calculation sheet', public: true },
  },
  {
    path: '/people',
    name: 'people',
    component: () => import('@/views/PeopleView.vue'),
    meta: { title: 'People', administrator: true },
  },
  {
    path: '/account',
    name: 'account',
    component: () => import('@/views/AccountView.vue'),
    meta: { title: 'Account' },
  },
  {
    path: '/:rest(.*)*',
    name: 'not-found',
    component: () => import('@/views/NotFoundView.vue'),
    meta: { title: 'Not found', public: true },
  },
]

/** Routes with their guards: who is not signed in goes to the sign-in page, and from there where they wanted to go. */
export function createAppRouter(history: RouterHistory = createWebHistory()) {
  const router = createRouter({ history, routes })
  router.beforeEach(async (to) => {
    if (to.meta.public) return true
    const session = useSessionStore()
    await session.ensureKnown()
    if (!session.user) return { name: 'sign-in', query: { to: to.fullPath } }
    if (to.meta.administrator && session.user.role !== 'administrator') return { name: 'jobs' }
    return true
  })
  router.afterEach((to) => {
    document.title = `${to.meta.title} · Girdwell`
  })
  return router
}
