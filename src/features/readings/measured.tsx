import type { Reading, SidePage } from '#shared/contracts/readings.ts';
import { CourseSection } from './course/course-section.tsx';
import { ReadingHead } from './head/reading-head.tsx';
import { LiftSection } from './lift/lift-section.tsx';
import { HistorySection } from './history/history-section.tsx';
import { PlanSection } from './plan-section.tsx';
import { ReplaySection } from './link/replay-section.tsx';
import { PartsSection } from './parts/parts-section.tsx';
import { AssumptionSection } from './reasons/assumption-section.tsx';
import { MarkErrorSection } from './reasons/mark-error-section.tsx';
import { ProtocolSection } from './reasons/protocol-section.tsx';
import { ReasonsSection } from './reasons/reasons-section.tsx';
import { SettleSection } from './reasons/settle-section.tsx';
import { BothSides } from './sides/both-sides.tsx';
import { SignOffSection } from './sign-off/sign-off-section.tsx';
import { SubstitutionsSection } from './substitutions/substitutions-section.tsx';

/** The page of a side that has marks, whatever they add up to. */
export function Measured({ page, reading }: { page: SidePage; reading: Reading }) {
  return (
    <>
      <ReadingHead page={page} reading={reading} />
      <SettleSection reading={reading} />
      <CourseSection reading={reading} />
      <LiftSection reading={reading} />
      <PartsSection reading={reading} />
      <SubstitutionsSection reading={reading} />
      <BothSides page={page} reading={reading} />
      <ReasonsSection reading={reading} />
      <AssumptionSection page={page} />
      <MarkErrorSection page={page} reading={reading} />
      <ProtocolSection page={page} reading={reading} />
      <SignOffSection page={page} />
      <PlanSection page={page} />
      <ReplaySection page={page} />
      <HistorySection page={page} />
    </>
  );
}
