/** The two families of units a person can choose; everything inside is metric. */
export type Units = 'cm' | 'in';
