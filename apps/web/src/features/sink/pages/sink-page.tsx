import { Box, Button, chakra } from '@chakra-ui/react';
import { strip } from '../../../shared/actions/strip.store.js';
import { useUndo } from '../../../shared/actions/use-undo.js';
import { useDarkroom, useMay } from '../../../shared/darkroom/darkroom-context.js';
import { paths } from '../../../shared/routes/paths.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { ButtonLink } from '../../../shared/ui/links.js';
import { PageHeading } from '../../../shared/ui/page-heading.js';
import { useBottles } from '../../bottles/api/get-bottles.js';
import { takesFilm } from '../../bottles/line-order.js';
import { useStandings } from '../../bottles/use-standings.js';
import { LazyLoadSheet } from '../../loads/components/lazy-load-sheet.js';
import { useLoadSheet } from '../../loads/use-load-sheet.js';
import { verdictWords } from '../../loads/verdict-words.js';
import { SinkOutline } from '../components/sink-outline.js';
import { SinkRow } from '../components/sink-row.js';
import { useSinkKeys } from '../use-sink-keys.js';

function EmptySink() {
  const { address } = useDarkroom();
  const mayMix = useMay('technician');
  return (
    <Box>
      <Box mb="3">Nothing stands at the sink yet.</Box>
      {mayMix && <ButtonLink to={paths.newMix(address)}>Record a mix</ButtonLink>}
    </Box>
  );
}

/** The first screen: what is in every bottle, and one button to put a load through. */
export function SinkPage() {
  const { zone } = useDarkroom();
  const query = useBottles();
  const standings = useStandings(query.data);
  const sheet = useLoadSheet();
  const undo = useUndo();
  const baths = standings.filter(takesFilm);
  const openAll = (): void => sheet.open(baths.map(({ bottle }) => bottle.id));
  const undoLast = (): void => {
    const last = strip.get();
    if (last) undo(last);
  };
  useSinkKeys(() => baths.length > 0 && openAll(), undoLast);

  return (
    <>
      <PageHeading title="Sink" says={verdictWords(baths)} />
      <Fetched query={query} what="the sink" zone={zone} outline={<SinkOutline />}>
        {() =>
          standings.length === 0 ? (
            <EmptySink />
          ) : (
            <>
              <chakra.ul
                listStyleType="none"
                aria-label="Bottles in use"
                borderTopWidth="1px"
                borderColor="line"
              >
                {standings.map((standing) => (
                  <SinkRow
                    key={standing.bottle.id}
                    standing={standing}
                    takesLoads={takesFilm(standing)}
                    onOpen={() => sheet.open([standing.bottle.id])}
                  />
                ))}
              </chakra.ul>
              {baths.length > 0 && (
                <Box position="sticky" bottom={{ base: '14', lg: '0' }} bg="bg" py="2">
                  <Button w={{ base: '100%', lg: 'auto' }} minH="13" fontWeight="700" onClick={openAll}>
                    Put a load through
                  </Button>
                </Box>
              )}
            </>
          )
        }
      </Fetched>
      <LazyLoadSheet sheet={sheet} standings={standings} />
    </>
  );
}
