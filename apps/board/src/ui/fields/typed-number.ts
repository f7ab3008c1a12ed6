/** What was typed as a number: `null` when empty, `NaN` when it is none. A decimal comma is read as a point. */
export function parseTypedNumber(text: string): number | null {
  const trimmed = text.trim().replace(',', '.');
  if (trimmed === '') return null;
  return /^[-+]?(\d+\.?\d*|\.\d+)$/.test(trimmed) ? Number(trimmed) : Number.NaN;
}

/** One step up or down, with as many decimals as the text or the step has. */
export function stepNumber(text: string, step: number): string {
  const current = parseTypedNumber(text);
  const decimals = Math.max(decimalsOf(text), decimalsOf(String(step)));
  const from = current === null || Number.isNaN(current) ? 0 : current;
  return (from + step).toFixed(decimals);
}

function decimalsOf(text: string): number {
  return /[.,](\d*)/.exec(text)?.[1]?.length ?? 0;
}
