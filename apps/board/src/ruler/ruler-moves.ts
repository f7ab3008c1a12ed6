/** Where the focus goes on the ruler for each key. */
export interface Stop {
  readonly key: string;
  readonly laneIndex: number;
  readonly x: number;
}

export interface MoveContext {
  /** By lane, then from left to right. */
  readonly stops: readonly Stop[];
  readonly todayX: number;
  readonly dependencyKeys: readonly string[];
}

function nearest(stops: readonly Stop[], x: number): Stop | undefined {
  return stops.toSorted((a, b) => Math.abs(a.x - x) - Math.abs(b.x - x))[0];
}

function onNextLane(stops: readonly Stop[], from: Stop, step: 1 | -1): Stop | undefined {
  const lanes = [...new Set(stops.map((stop) => stop.laneIndex))];
  const next =
    step === 1 ? lanes.find((lane) => lane > from.laneIndex) : lanes.findLast((lane) => lane < from.laneIndex);
  return nearest(
    stops.filter((stop) => stop.laneIndex === next),
    from.x,
  );
}

type Move = (context: MoveContext, from: Stop, lane: readonly Stop[]) => Stop | undefined;

const moves: Readonly<Record<string, Move>> = {
  ArrowRight: (_context, from, lane) => lane[lane.indexOf(from) + 1],
  ArrowLeft: (_context, from, lane) => lane[lane.indexOf(from) - 1],
  ArrowDown: ({ stops }, from) => onNextLane(stops, from, 1),
  ArrowUp: ({ stops }, from) => onNextLane(stops, from, -1),
  Home: (_context, _from, lane) => lane[0],
  End: (_context, _from, lane) => lane.at(-1),
  t: ({ todayX }, _from, lane) => nearest(lane, todayX),
  d: ({ stops, dependencyKeys }, from) => nextDependency(stops, from, dependencyKeys),
};

/** The stop that a key leads to; the same one when there is nothing further; `null` for keys that do not move. */
export function nextStop(context: MoveContext, from: Stop, pressed: string): Stop | null {
  const move = moves[pressed.length === 1 ? pressed.toLowerCase() : pressed];
  if (move === undefined) return null;
  const lane = context.stops.filter((stop) => stop.laneIndex === from.laneIndex);
  return move(context, from, lane) ?? from;
}

/** Round the dependencies, one at each press. */
function nextDependency(stops: readonly Stop[], from: Stop, keys: readonly string[]): Stop {
  const known = keys.flatMap((key) => stops.find((stop) => stop.key === key) ?? []);
  const at = known.findIndex((stop) => stop.key === from.key);
  return known[(at + 1) % Math.max(1, known.length)] ?? from;
}
