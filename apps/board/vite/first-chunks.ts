/**
 * What every page of the team needs comes in two files instead of forty: browsers fetch few files at a time, and the
 * first answer of the API would wait behind them all.
 */
import path from 'node:path';
import type { Plugin, Rolldown } from 'vite';

const source = path.resolve(import.meta.dirname, '../src');
const files = { start: 'main.tsx', frame: 'pages/team-frame.tsx', firstPage: 'pages/my-work-page.tsx' } as const;
type Part = keyof typeof files;

/** Descriptions of operations stand alone; what they import are schemas, which the first screens do without. */
const standsAlone = (id: string): boolean => id.includes('/packages/contract/src/');

type Graph = Pick<Rolldown.PluginContext, 'getModuleInfo'>;

/** Everything that a part imports, without what it fetches later. */
const importedBy = (part: Part, graph: Graph): ReadonlySet<string> => {
  const found = new Set<string>();
  const follow = (id: string): void => {
    if (found.has(id)) return;
    found.add(id);
    if (!standsAlone(id)) for (const next of graph.getModuleInfo(id)?.importedIds ?? []) follow(next);
  };
  follow(path.join(source, files[part]));
  return found;
};

const nameOf = () => {
  const known = new Map<Part, ReadonlySet<string>>();
  return (id: string, graph: Graph): string | null => {
    const isIn = (part: Part): boolean => {
      const ids = known.get(part) ?? importedBy(part, graph);
      known.set(part, ids);
      return ids.has(id);
    };
    if (isIn('start')) return 'start';
    // What My work draws with, other pages draw with too.
    const isOwn = id.startsWith(path.join(source, 'features/my-work/')) || id === path.join(source, files.firstPage);
    return isIn('frame') || (isIn('firstPage') && !isOwn) ? 'frame' : null;
  };
};

export const firstChunks = (): Rolldown.CodeSplittingOptions => ({
  includeDependenciesRecursively: false,
  groups: [{ name: nameOf() }],
});

/** The page asks for the frame together with the start, before the start has run. */
export const fetchFrameAtOnce = (): Plugin => ({
  name: 'fetch-frame-at-once',
  apply: 'build',
  transformIndexHtml: {
    order: 'post',
    handler: (_html, { bundle }) =>
      Object.values(bundle ?? {})
        .filter((file) => file.type === 'chunk' && file.name === 'frame')
        .map(({ fileName }) => ({
          tag: 'link',
          attrs: { rel: 'modulepreload', crossorigin: true, href: `/${fileName}` },
          injectTo: 'head',
        })),
  },
});
