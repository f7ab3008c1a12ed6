/** JSON nested too deep parses well and then breaks whatever walks it; looked at first, without recursion. */
import type { RequestHandler } from 'express';
import { limits } from '../limits.ts';
import { refused } from './outcome.ts';
import { sendProblem } from './problem-answer.ts';

/** How deep and how large a JSON value is; stops counting past the limits. */
export const isShapeAllowed = (value: unknown, depth: number, nodes: number): boolean => {
  const open: { readonly value: unknown; readonly depth: number }[] = [{ value, depth: 1 }];
  let count = 0;
  for (let next = open.pop(); next !== undefined; next = open.pop()) {
    count += 1;
    if (next.depth > depth || count > nodes) return false;
    if (typeof next.value === 'object' && next.value !== null) {
      for (const child of Object.values(next.value)) open.push({ value: child, depth: next.depth + 1 });
    }
  }
  return true;
};

/** `nodes` may be larger for documents such as a protocol. */
export const requireShape =
  (nodes: number = limits.jsonNodes): RequestHandler =>
  (request, response, next) =>
    isShapeAllowed(request.body, limits.jsonDepth, nodes)
      ? next()
      : sendProblem(response, refused('too-large', { detail: 'The body is nested too deep or has too many parts.' }));
