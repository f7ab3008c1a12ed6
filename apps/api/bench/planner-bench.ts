/** The planner against the least that the work needs: adding calendar months to a birthday, three times a milestone. */
import { addMonthsToDay, toEpochDay } from '@weftway/calendar/plain-date';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { planPathway } from '@weftway/pathway/plan-pathway';
import { planRows } from '@weftway/pathway/plan-rows';
import { clinicalStatus, nextChangeDay } from '@weftway/pathway/state-of-milestone';
import { benchToday, sampleChildren } from './sample-facts.ts';
import { cpuOf, head, inTurns, line, ratioLine } from './measure.ts';

const rounds = 5;
const withReasons = 1_000;

export const benchPlanner = async (count: number): Promise<void> => {
  head(
    `Planner, ${count.toLocaleString('en')} invented children × ${String(defaultProtocol.milestones.length)} milestones, CPU a milestone`,
  );
  const children = sampleChildren(count);
  const births = Int32Array.from(children, (child) => toEpochDay(child.birth));
  const months = defaultProtocol.milestones.flatMap((_rule, at) => [at * 3, at * 3 + 2, at * 3 + 5]);
  const out = new Int32Array(births.length * months.length);
  const perChild = defaultProtocol.milestones.length;
  let checksum = 0;
  /** The bulk path: integer dates, clinical word and next change of every milestone. */
  const planBare = (of: typeof children) => () => {
    for (const child of of) {
      const planned = planRows(defaultProtocol, child.facts, benchToday, { reasons: false });
      const { today } = planned.planning.child;
      for (const row of planned.rows) {
        checksum += clinicalStatus(planned.planning, row, today).length + nextChangeDay(planned.planning, row, today);
      }
    }
  };
  const planDressed = (of: typeof children, reasons: boolean) => () => {
    for (const child of of)
      checksum += planPathway(defaultProtocol, child.facts, benchToday, { reasons }).milestones.length;
  };
  const some = children.slice(0, withReasons);
  // Each round plans its own share, so that all of them are planned once.
  const share = Math.ceil(count / (rounds + 1));
  let shares = 0;
  const nextShare = () => children.slice((shares += 1) * share - share, shares * share);
  const nanos = async (work: () => void, count_: () => number) => ((await cpuOf(work)) * 1e6) / count_();
  const measured = await inTurns(rounds, {
    reference: () =>
      nanos(
        () => {
          let at = 0;
          for (const birth of births) for (const month of months) out[at++] = addMonthsToDay(birth, month);
        },
        () => out.length / 3,
      ),
    rows: () => {
      const of = nextShare();
      return nanos(planBare(of), () => of.length * perChild);
    },
    without: () => nanos(planDressed(some, false), () => some.length * perChild),
    withReasons: () => nanos(planDressed(some, true), () => some.length * perChild),
  });
  if (checksum === 0) throw new Error('Nothing was planned');
  line('bare month arithmetic (reference)', `${measured.reference.toFixed(0)} ns`, '', null);
  ratioLine('planner without reasons (rows as numbers)', measured.rows, measured.reference, 10, 'ns');
  ratioLine('planner without reasons, as the board takes it', measured.without, measured.reference, null, 'ns');
  ratioLine(
    `planner with full reasons (${withReasons.toLocaleString('en')} children)`,
    measured.withReasons,
    measured.reference,
    60,
    'ns',
  );
};
