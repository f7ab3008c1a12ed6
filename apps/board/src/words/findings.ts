/** The findings and decisions that protocols ask about, in plain words. */
const names: Readonly<Record<string, string>> = {
  prenatal_referral: 'Referred before birth',
  birth_referral: 'Referred to the team',
  palate: 'Cleft of the palate found',
  lip: 'Cleft of the lip found',
  gum: 'Cleft of the gum found',
  smcp: 'Submucous cleft palate',
  robin: 'Robin sequence (small jaw, tongue falls back)',
  airway: 'Breathing problem',
  syndrome: 'Syndrome found',
  deletion_22q11: '22q11 deletion',
  operation_is_palate: 'The operation is on the palate',
  stickler_risk: 'Stickler syndrome possible',
  stickler_not_excluded: 'Stickler syndrome not ruled out',
  stickler_excluded: 'Stickler syndrome ruled out',
  plate_chosen: 'Family chose molding with a plate',
  stent_chosen: 'Nose stent chosen',
  gap_le_5mm: 'Gap at the gum is 5 mm or less',
  molding_started: 'Molding has started',
  fistula_symptomatic: 'A hole in the palate causes trouble',
  screen_failed: 'Hearing screen not passed',
  tubes: 'Ear tubes are in place',
  tubes_decided: 'Ear tubes decided',
  tubes_with_palate: 'Ear tubes together with the palate',
  vpi_suspected: 'Air escapes through the nose in speech',
  vpi_surgery_decided: 'Speech surgery decided',
  expansion_needed: 'The arch must be widened before the graft',
  expansion_started: 'Widening of the arch has begun',
  root_low: 'Canine root reached the lower bound',
  early_incisor_track: 'Early graft track for the incisor chosen',
  graft_not_needed: 'No bone graft needed',
  gum_lane_applies: 'Notched gum: does a graft apply?',
  regraft_needed: 'A second graft is needed',
  canine_in_arch: 'Eye tooth is in the arch',
  treatment_need: 'Full braces will be needed',
  jaw_mismatch: 'Jaws do not meet as they should',
  jaw_surgery_planned: 'Jaw surgery planned',
  lateral_missing: 'The small front tooth is missing',
  lateral_peg: 'The small front tooth is peg-shaped',
  replacement_planned: 'Replacement of the tooth planned',
  feeding_concern: 'Worry about feeding',
  mood_concern: 'Worry about mood',
};

/** A finding by its name in the protocol; a name that the team made up is read as words. */
export const findingWords = (name: string): string => {
  const known = names[name];
  if (known !== undefined) return known;
  const words = name.replaceAll('_', ' ');
  return words.charAt(0).toUpperCase() + words.slice(1);
};
