import { randomUUID } from 'node:crypto';
import { product } from '#server/db/in-practice.ts';
import { Call } from '#server/features/calls/call.entity.ts';
import { makeClip } from '#server/features/clips/clip.factory.ts';
import { Upload } from '#server/features/clips/upload.entity.ts';
import { Comment } from '#server/features/comments/comment.entity.ts';
import { makeAthlete, makeConsent } from '#server/features/athletes/athlete.factory.ts';
import { makeUser } from '#server/features/accounts/user.factory.ts';
import { makeVisit } from '#server/features/visits/visit.factory.ts';
import { MailLink } from '#server/features/mail-links/mail-link.entity.ts';
import { PlanItem } from '#server/features/plans/plan-item.entity.ts';
import { Plan } from '#server/features/plans/plan.entity.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import { Replay } from '#server/features/replays/replay.entity.ts';
import type { ReportContent } from '#server/features/reports/report-content.ts';
import { Report } from '#server/features/reports/report.entity.ts';
import { makeRep } from '#server/features/reps/rep.factory.ts';
import { SecondMarking } from '#server/features/second-markings/second-marking.entity.ts';
import { SetUp } from '#server/features/visits/set-up.entity.ts';
import { Session } from '#server/features/accounts/session.entity.ts';
import type { Api } from './api.ts';
import type { Ids } from './every-route.ts';

/** A report that says nothing. */
export const emptyReport = (name = 'Wren Marsh'): ReportContent => ({
  practice: { name: 'Test Practice', contact: '' },
  athlete: { name, birthDate: '1999-04-01' },
  visit: {
    day: '2026-03-03',
    coach: 'A coach',
    filming: {
      distanceMm: null,
      lensHeightMm: null,
      rodMm: null,
      beltPointerMm: null,
      thighPointerMm: null,
    },
    views: [],
    clips: 0,
  },
  sides: [],
  compared: null,
  plans: [],
});

/** A new thing of each kind that a route can name, all of the world's first coach. */
export const makeOneOfEach = ({ ground, world }: Api): Promise<Ids> => {
  const { coach, practiceId } = world;
  return ground.inPractice(product(practiceId), async ({ em }) => {
    const athlete = makeAthlete(em, { coach, givenName: 'Wren' });
    const consent = makeConsent(em, { athlete, recordedBy: coach });
    const visit = makeVisit(em, { athlete, coach });
    const person = makeUser(em, { role: 'coach' });
    const clip = makeClip(em, { visit, uploadedBy: coach });
    const rep = makeRep(em, { clip, createdBy: coach });
    const comment = em.create(Comment, {
      clip,
      body: 'Words.',
      fromFrame: 0,
      toFrame: 0,
      shared: true,
      by: coach,
    });
    const replay = em.create(Replay, {
      visit,
      rep,
      side: 'right',
      fromFrame: 0,
      toFrame: 9,
      showReading: true,
      showCall: true,
      message: '',
      tokenHash: randomUUID(),
      passPhraseHash: null,
      expiresAt: new Date(Date.now() + 1e8),
      by: coach,
    });
    const secondMarking = em.create(SecondMarking, {
      rep,
      marker: coach,
      askedBy: coach,
      frames: [{ frame: 1, landmarks: ['asis-support'] }],
      first: [],
      phases: {},
    });
    const report = em.create(Report, {
      visit,
      number: 1,
      state: 'ready',
      content: emptyReport(),
      pages: 1,
      bytes: 1,
      by: coach,
    });
    const failedReport = em.create(Report, {
      visit,
      number: 2,
      state: 'failed',
      content: emptyReport(),
      by: coach,
    });
    const upload = em.create(Upload, {
      visit,
      name: 'a.mp4',
      bytes: 10,
      view: 'front',
      mirrored: false,
      openedBy: coach,
    });
    const setUp = em.create(SetUp, {
      name: `Hall ${randomUUID()}`,
      distanceMm: 3000,
      savedBy: coach,
    });
    const session = em.create(Session, {
      user: coach,
      device: 'A test',
      expiresAt: new Date(Date.now() + 1e8),
    });
    const callOn = (of: typeof visit, side: 'left' | 'right') =>
      em.create(Call, {
        visit: of,
        side,
        seen: 'early',
        substitutions: [],
        confidence: 'sure',
        handsFelt: '',
        by: coach,
        beforeFigures: true,
      });
    callOn(visit, 'right');
    // two plans that could be given, of visits of their own
    const [plan, planToChange] = [0, 1].map(() => {
      const of = makeVisit(em, { athlete, coach });
      callOn(of, 'left');
      const made = em.create(Plan, {
        visit: of,
        side: 'left',
        basis: { kind: 'call', seen: 'early' },
        rule: 'early',
        because: 'It turns out early.',
        retestOn: '2999-01-01',
        madeBy: coach,
      });
      em.create(PlanItem, {
        plan: made,
        exercise: 'foot-tripod',
        position: 0,
        stage: 1,
        side: 'left',
        sideConfirmed: true,
        dose: exerciseOf('foot-tripod').dose,
      });
      return made;
    });
    if (!plan || !planToChange) throw new Error('Two plans are made.');
    const invitation = em.create(MailLink, {
      kind: 'invitation',
      email: `${randomUUID()}@test.example`,
      role: 'coach',
      by: coach,
      expiresAt: new Date(Date.now() + 1e8),
    });
    await em.flush();
    return {
      session: session.id,
      invitation: invitation.id,
      person: person.id,
      athlete: athlete.id,
      consent: consent.id,
      visit: visit.id,
      setUp: setUp.id,
      upload: upload.id,
      clip: clip.id,
      rep: rep.id,
      secondMarking: secondMarking.id,
      comment: comment.id,
      plan: plan.id,
      planToChange: planToChange.id,
      replay: replay.id,
      report: report.id,
      failedReport: failedReport.id,
    };
  });
};
