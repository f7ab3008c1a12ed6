/** Hatch of the closing part and pins of a held window; every drawing has its own, so ids never meet. */
export function WindowPatterns({ id }: { readonly id: string }) {
  return (
    <defs>
      <pattern id={hatchId(id)} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <line x1="1" y1="0" x2="1" y2="5" className="stroke-weld" strokeWidth="2" strokeOpacity="0.55" />
      </pattern>
      <pattern id={pinsId(id)} width="6" height="6" patternUnits="userSpaceOnUse">
        <line x1="3" y1="0" x2="3" y2="6" className="stroke-walnut" strokeWidth="1.2" />
      </pattern>
    </defs>
  );
}

export function hatchId(id: string): string {
  return `${id}-hatch`;
}

export function pinsId(id: string): string {
  return `${id}-pins`;
}
