const words: Record<string, string> = {
  over_capacity: 'over its capacity',
  past_date: 'after its date',
  on_hold: 'while it was on hold',
  after_discard: 'after it was discarded',
  incompatible: 'not made for this film',
  wrong_material: 'labelled for another material',
  volume_short: 'too little in the bottle',
  time_unsure: 'time not sure',
  late: 'recorded late',
  reported: 'reported afterwards',
};

/** A flag of the ledger in words. */
export const flagWords = (flag: string): string => words[flag] ?? flag.replaceAll('_', ' ');
