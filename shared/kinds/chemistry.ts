export const CHEMISTRIES = ['flooded', 'agm', 'gel', 'lifepo4'] as const;
export type Chemistry = (typeof CHEMISTRIES)[number];
