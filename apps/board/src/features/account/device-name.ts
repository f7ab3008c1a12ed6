/** "Firefox on Linux" from what a browser says of itself; null when nothing is known in it. */
const browsers = [
  ['Edg/', 'Edge'],
  ['OPR/', 'Opera'],
  ['Firefox/', 'Firefox'],
  ['Chrome/', 'Chrome'],
  ['Safari/', 'Safari'],
] as const;
const systems = [
  ['iPhone', 'iPhone'],
  ['iPad', 'iPad'],
  ['Android', 'Android'],
  ['Windows', 'Windows'],
  ['Mac OS X', 'Mac'],
  ['CrOS', 'ChromeOS'],
  ['Linux', 'Linux'],
] as const;

export const deviceName = (userAgent: string): string | null => {
  const browser = browsers.find(([mark]) => userAgent.includes(mark))?.[1];
  const system = systems.find(([mark]) => userAgent.includes(mark))?.[1];
  if (browser === undefined) return system ?? null;
  return system === undefined ? browser : `${browser} on ${system}`;
};
