/** Words for the marks and their legend; the states' own names come from the pathway package. */
export const markWords = {
  legend: 'What the marks mean',
  looseEnd: 'No owner',
  name: (state: string, unowned: boolean) => (unowned ? `${state}, unowned` : state),
} as const;
