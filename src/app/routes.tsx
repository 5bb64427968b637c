import type { ComponentType } from 'react';
import type { RouteObject } from 'react-router-dom';
import { ErrorPage, RootErrorPage } from './error-page.tsx';
import { NotFoundPage } from './not-found-page.tsx';
import { Root } from './root.tsx';
import { Starting } from './starting.tsx';
import { StaffFrame } from './staff-frame.tsx';

/** A page whose code is fetched when it is first opened. */
const lazily =
  (load: () => Promise<ComponentType>): (() => Promise<{ Component: ComponentType }>) =>
  async () => ({ Component: await load() });

/** Every page of the product. A page that is not here does not exist. */
export const pages: RouteObject[] = [
  {
    Component: Root,
    ErrorBoundary: RootErrorPage,
    HydrateFallback: Starting,
    children: [
      {
        path: 'sign-in',
        lazy: lazily(() =>
          import('#src/features/accounts/sign-in/sign-in-page.tsx').then((page) => page.SignInPage),
        ),
      },
      {
        path: 'forgot',
        lazy: lazily(() =>
          import('#src/features/accounts/forgot-page.tsx').then((page) => page.ForgotPage),
        ),
      },
      {
        path: 'reset/:token',
        lazy: lazily(() =>
          import('#src/features/accounts/reset-page.tsx').then((page) => page.ResetPage),
        ),
      },
      {
        path: 'join/:token',
        lazy: lazily(() =>
          import('#src/features/accounts/join-page.tsx').then((page) => page.JoinPage),
        ),
      },
      {
        path: 'confirm-email/:token',
        lazy: lazily(() =>
          import('#src/features/accounts/confirm-email-page.tsx').then(
            (page) => page.ConfirmEmailPage,
          ),
        ),
      },
      {
        path: 'start',
        lazy: lazily(() =>
          import('#src/features/accounts/start-page.tsx').then((page) => page.StartPage),
        ),
      },
      {
        Component: StaffFrame,
        children: [
          {
            // inside the frame, so that a page that fails keeps its navigation
            ErrorBoundary: ErrorPage,
            children: [
              {
                index: true,
                lazy: lazily(() =>
                  import('#src/features/today/today-page.tsx').then((page) => page.TodayPage),
                ),
              },
              {
                path: 'athletes',
                lazy: lazily(() =>
                  import('#src/features/athletes/athlete-list-page.tsx').then(
                    (page) => page.AthleteListPage,
                  ),
                ),
              },
              {
                path: 'athletes/new',
                lazy: lazily(() =>
                  import('#src/features/athletes/new-athlete-page.tsx').then(
                    (page) => page.NewAthletePage,
                  ),
                ),
              },
              {
                path: 'athletes/:id',
                lazy: lazily(() =>
                  import('#src/features/athletes/athlete-page.tsx').then(
                    (page) => page.AthletePage,
                  ),
                ),
              },
              {
                path: 'athletes/:id/edit',
                lazy: lazily(() =>
                  import('#src/features/athletes/edit-athlete-page.tsx').then(
                    (page) => page.EditAthletePage,
                  ),
                ),
              },
              {
                path: 'athletes/:id/consents/new',
                lazy: lazily(() =>
                  import('#src/features/athletes/new-consent-page.tsx').then(
                    (page) => page.NewConsentPage,
                  ),
                ),
              },
              {
                path: 'athletes/:id/visits/new',
                lazy: lazily(() =>
                  import('#src/features/visits/new-visit-page.tsx').then(
                    (page) => page.NewVisitPage,
                  ),
                ),
              },
              {
                path: 'visits/:id',
                lazy: lazily(() =>
                  import('#src/features/visits/visit-page.tsx').then((page) => page.VisitPage),
                ),
              },
              {
                path: 'visits/:id/sides/:side',
                lazy: lazily(() =>
                  import('#src/features/readings/reading-page.tsx').then(
                    (page) => page.ReadingPage,
                  ),
                ),
              },
              {
                path: 'visits/:id/sides/:side/call',
                lazy: lazily(() =>
                  import('#src/features/readings/call/call-page.tsx').then((page) => page.CallPage),
                ),
              },
              {
                path: 'visits/:id/sides/:side/plan',
                lazy: lazily(() =>
                  import('#src/features/plans/plan-start-page.tsx').then(
                    (page) => page.PlanStartPage,
                  ),
                ),
              },
              {
                path: 'plans/:id',
                lazy: lazily(() =>
                  import('#src/features/plans/plan-page.tsx').then((page) => page.PlanPage),
                ),
              },
              {
                path: 'clips/:id',
                lazy: lazily(() =>
                  import('#src/features/bench/bench-page.tsx').then((page) => page.BenchPage),
                ),
              },
              {
                path: 'second-markings/:id',
                lazy: lazily(() =>
                  import('#src/features/bench/blind/blind-page.tsx').then((page) => page.BlindPage),
                ),
              },
              {
                path: 'compare',
                lazy: lazily(() =>
                  import('#src/features/compare/compare-page.tsx').then((page) => page.ComparePage),
                ),
              },
              {
                path: 'review',
                lazy: lazily(() =>
                  import('#src/features/reviews/review-page.tsx').then((page) => page.ReviewPage),
                ),
              },
              {
                path: 'practice',
                lazy: lazily(() =>
                  import('#src/features/practice/home/practice-page.tsx').then(
                    (page) => page.PracticePage,
                  ),
                ),
              },
              {
                path: 'practice/audit',
                lazy: lazily(() =>
                  import('#src/features/practice/audit/audit-page.tsx').then(
                    (page) => page.AuditPage,
                  ),
                ),
              },
              {
                path: 'practice/reliability',
                lazy: lazily(() =>
                  import('#src/features/practice/reliability/reliability-page.tsx').then(
                    (page) => page.ReliabilityPage,
                  ),
                ),
              },
              {
                path: 'account',
                lazy: lazily(() =>
                  import('#src/features/accounts/account/account-page.tsx').then(
                    (page) => page.AccountPage,
                  ),
                ),
              },
              {
                path: 'practice/people',
                lazy: lazily(() =>
                  import('#src/features/practice/people/people-page.tsx').then(
                    (page) => page.PeoplePage,
                  ),
                ),
              },
              {
                path: 'practice/protocol',
                lazy: lazily(() =>
                  import('#src/features/practice/protocol/protocol-page.tsx').then(
                    (page) => page.ProtocolPage,
                  ),
                ),
              },
              {
                path: 'practice/consent',
                lazy: lazily(() =>
                  import('#src/features/practice/consent/consent-wording-page.tsx').then(
                    (page) => page.ConsentWordingPage,
                  ),
                ),
              },
              {
                path: 'practice/retention',
                lazy: lazily(() =>
                  import('#src/features/practice/retention/retention-page.tsx').then(
                    (page) => page.RetentionPage,
                  ),
                ),
              },
              {
                path: 'practice/exercises',
                lazy: lazily(() =>
                  import('#src/features/practice/exercises/exercises-page.tsx').then(
                    (page) => page.ExercisesPage,
                  ),
                ),
              },
              {
                path: 'practice/set-ups',
                lazy: lazily(() =>
                  import('#src/features/practice/set-ups-page.tsx').then((page) => page.SetUpsPage),
                ),
              },
              {
                path: 'method',
                lazy: lazily(() =>
                  import('#src/features/method/method-page.tsx').then((page) => page.MethodPage),
                ),
              },
              {
                path: 'licences',
                lazy: lazily(() =>
                  import('#src/features/licences/licences-page.tsx').then(
                    (page) => page.LicencesPage,
                  ),
                ),
              },
              { path: '*', Component: NotFoundPage },
            ],
          },
        ],
      },
    ],
  },
];
