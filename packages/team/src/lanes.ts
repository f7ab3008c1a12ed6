/** The thirteen lanes of the pathway, in the order in which they are drawn. */
export const lanes = [
  'team',
  'feeding-and-fitness',
  'genetics',
  'molding',
  'surgery',
  'hearing',
  'speech',
  'teeth',
  'orthodontics-and-graft',
  'growth-and-jaw',
  'family-and-mind',
  'outcome-records',
  'transition',
] as const;

export type Lane = (typeof lanes)[number];

export const laneNames: Readonly<Record<Lane, string>> = {
  team: 'Team',
  'feeding-and-fitness': 'Feeding and fitness',
  genetics: 'Genetics',
  molding: 'Molding',
  surgery: 'Surgery',
  hearing: 'Ears and hearing',
  speech: 'Speech',
  teeth: 'Teeth',
  'orthodontics-and-graft': 'Orthodontics and graft',
  'growth-and-jaw': 'Growth and jaw',
  'family-and-mind': 'Family and mind',
  'outcome-records': 'Outcome records',
  transition: 'Moving on',
};
