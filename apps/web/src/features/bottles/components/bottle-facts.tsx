import { Box, chakra } from '@chakra-ui/react';
import { showDate, showDilution, showVolume } from '@wetside/chemistry';
import { today } from '../../../shared/clock/web-clock.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { showMoney } from '../../../shared/formats/amounts.js';
import type { Standing } from '../standing.js';

const stateWords = {
  full: 'full',
  'part-full': 'part full',
  'floating-lid': 'under a floating lid',
  'open-tray': 'in an open tray',
} as const;

/** What is in it, since when, by whom. */
export function BottleFacts({ standing }: { standing: Standing }) {
  const { zone, currency } = useDarkroom();
  const { bottle, document } = standing;
  const { totals } = bottle;
  const now = today(zone);
  const facts = [
    ['In it', `${showVolume(totals.volumeUl)}, ${stateWords[totals.containerState]}`],
    ['Mixed', `${totals.about ? 'about ' : ''}${showDate(totals.mixedOn, now)} by ${bottle.mixedBy}`],
    ['Dilution', showDilution(document.dilution)],
    ['Loads', String(totals.loads)],
    ...(bottle.costMinor === null
      ? []
      : [['Cost', showMoney(bottle.costMinor, bottle.currency ?? currency)]]),
  ];
  return (
    <chakra.dl display="grid" gridTemplateColumns="7rem 1fr" gap="2" mb="2">
      {facts.map(([name, words]) => (
        <Box display="contents" key={name}>
          <chakra.dt color="ink.muted">{name}</chakra.dt>
          <chakra.dd>{words}</chakra.dd>
        </Box>
      ))}
    </chakra.dl>
  );
}
