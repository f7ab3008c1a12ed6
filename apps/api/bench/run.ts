/** Speed of the product, as ratios to plain programs measured in the same run. Nothing here is a test. */
import { openBenchTeam } from './bench-team.ts';
import { say } from './measure.ts';
import { benchPlanner } from './planner-bench.ts';
import { benchScreens } from './screens-bench.ts';
import { benchServer } from './server-bench.ts';

const started = performance.now();
say(
  'Medians of alternating rounds; ✓ the aim is reached, · it is not. Ratios count, milliseconds depend on the machine.',
);
await benchPlanner(20_000);
const team = await openBenchTeam(3_000);
await benchServer(team);
await benchScreens(team);
await team.close();
say(`\nTook ${((performance.now() - started) / 1000).toFixed(0)} s.`);
process.exit(0);
