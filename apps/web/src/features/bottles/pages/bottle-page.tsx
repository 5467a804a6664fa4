import { Box, Flex, Grid } from '@chakra-ui/react';
import { useParams } from 'react-router-dom';
import type { BottlePageData } from '../../../shared/api/types.js';
import { today } from '../../../shared/clock/web-clock.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { PageHeading, SectionHeading } from '../../../shared/ui/page-heading.js';
import { StateMark } from '../../../shared/ui/state-mark.js';
import { LogRows } from '../../log/components/log-rows.js';
import { useBottle } from '../api/get-bottle.js';
import { BottleActions } from '../components/bottle-actions.js';
import { BottleFacts } from '../components/bottle-facts.js';
import { Limits } from '../components/limits.js';
import { limitWords } from '../standing.js';
import { useStanding } from '../use-standings.js';

function Bottle({ data }: { data: BottlePageData }) {
  const { zone } = useDarkroom();
  const standing = useStanding(data);
  const { bottle, assessment, sentence } = standing;
  const limit = limitWords(standing);
  return (
    <>
      <PageHeading title={`${bottle.code} ${bottle.name}`} says={sentence}>
        <BottleActions standing={standing} />
      </PageHeading>
      <Flex gap="3" align="center" wrap="wrap" mb="4">
        <StateMark verdict={assessment.verdict} />
        {assessment.verdict === 'open' && <Box color="ink.muted">No limit reached.</Box>}
        {limit && limit !== sentence && <Box>{limit}</Box>}
      </Flex>
      <BottleFacts standing={standing} />
      <Grid templateColumns={{ base: 'minmax(0, 1fr)', xl: 'minmax(0, 1fr) minmax(0, 1fr)' }} gapX="8">
        <Limits standing={standing} />
        <section aria-labelledby="happened">
          <SectionHeading id="happened">What happened</SectionHeading>
          <LogRows label="What happened" entries={data.history} today={today(zone)} />
        </section>
      </Grid>
    </>
  );
}

export function BottlePage() {
  const { code = '' } = useParams();
  const { zone } = useDarkroom();
  const query = useBottle(code);
  return (
    <Fetched query={query} what="the bottle" missing="bottle" zone={zone}>
      {(data) => <Bottle key={data.bottle.id} data={data} />}
    </Fetched>
  );
}
