import { Navigate } from 'react-router-dom'
import type { RouteObject } from 'react-router-dom'
import { savesData } from '../offline/network.ts'
import { PageError } from './page-error.tsx'
import { Shell } from './shell.tsx'

const check = () => import('../triage/check.page.tsx')
const steps = () => import('../triage/steps.page.tsx')
const volts = () => import('../triage/volts.page.tsx')
const result = () => import('../triage/result.page.tsx')
const readers = () => import('../editions/read-files.ts')

/** The check whole, fetched once the first page stands, so that it works when the network goes. */
export const bringTriage = () => Promise.all([check(), steps(), volts(), result(), readers()])

const diagnosis = () => import('../diagnosis/diagnosis.page.tsx')
const articles = () => import('../articles/articles.page.tsx')
const edit = () => import('../articles/edit.page.tsx')
const article = () => import('../articles/article.page.tsx')
const cause = () => import('../articles/cause.page.tsx')
const test = () => import('../articles/test.page.tsx')
const worksheets = () => import('../worksheets/worksheets.page.tsx')
const worksheet = () => import('../worksheets/worksheet.page.tsx')
const bondAudit = () => import('../bond-audit/bond-audit.page.tsx')

/**
 * The tech's pages and what the shop knows, for a tab that stays open where no worker can keep the pages. The edition's
 * files come beside it, with the first look at what is in force. Not for whoever pays by the megabyte.
 */
export const bringLibrary = async () =>
  savesData()
    ? []
    : Promise.all([
        diagnosis(),
        articles(),
        article(),
        cause(),
        test(),
        worksheets(),
        worksheet(),
        bondAudit(),
      ])

/** Every page, fetched when it is first opened. Loaders never wait for data: pages own waiting, failing, no network. */
export const routes: RouteObject[] = [
  {
    Component: Shell,
    HydrateFallback: () => null,
    children: [
      {
        ErrorBoundary: PageError,
        children: [
          { index: true, lazy: () => import('../front/front.page.tsx') },
          {
            path: 'check',
            lazy: check,
            children: [
              { index: true, element: <Navigate to="/check/1" replace /> },
              { path: 'stop', lazy: async () => ({ Component: (await check()).StopNow }) },
              { path: 'result', lazy: result },
              { path: '5', lazy: volts },
              { path: '1', lazy: async () => ({ Component: (await check()).DangerStep }) },
              { path: ':step', lazy: steps },
            ],
          },
          { path: 'diagnosis', lazy: diagnosis },
          { path: 'sheets/:token', lazy: () => import('../diagnosis/shared-sheet.page.tsx') },
          { path: 'not-sent', lazy: () => import('../sheets/not-sent.page.tsx') },
          { path: 'articles', lazy: articles },
          { path: 'articles/new', lazy: async () => ({ Component: (await edit()).NewArticle }) },
          { path: 'articles/:slug/edit', lazy: edit },
          { path: 'articles/:slug', lazy: article },
          { path: 'causes/:id', lazy: cause },
          { path: 'tests/:id', lazy: test },
          { path: 'worksheets', lazy: worksheets },
          { path: 'worksheets/:name', lazy: worksheet },
          { path: 'worksheets/bond-audit', lazy: bondAudit },
          { path: 'editions', lazy: () => import('../editions/editions.page.tsx') },
          { path: 'sign-in', lazy: () => import('../people/sign-in.page.tsx') },
          { path: 'sign-up', lazy: () => import('../people/sign-up.page.tsx') },
          { path: 'set-password', lazy: () => import('../people/set-password.page.tsx') },
          { path: 'account', lazy: () => import('../people/account.page.tsx') },
          { path: 'shop/people', lazy: () => import('../people/people.page.tsx') },
          { path: '*', lazy: () => import('./not-found.page.tsx') },
        ],
      },
    ],
  },
]
