import type { BoardRow } from '../../queries/board-model.ts';

/** The child's page with this milestone chosen. */
export const addressOf = (row: BoardRow): string =>
  `/children/${encodeURIComponent(row.child.id)}?m=${encodeURIComponent(row.milestone.key)}`;
