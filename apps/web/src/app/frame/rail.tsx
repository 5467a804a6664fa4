import { Box, Flex } from '@chakra-ui/react';
import { useLocation } from 'react-router-dom';
import { useDarkroom } from '../../shared/darkroom/darkroom-context.js';
import { paths } from '../../shared/routes/paths.js';
import { CodeBox } from './code-box.js';
import { PlaceLink } from './place-link.js';
import { isAt, railPlaces } from './places.js';

/** The desk's way about: at the left, the person at its foot. */
export function Rail({ needsYou }: { needsYou: number | undefined }) {
  const { address, name, me } = useDarkroom();
  const { pathname } = useLocation();
  const places = railPlaces(me.role);
  return (
    <Flex
      as="header"
      hideBelow="lg"
      direction="column"
      w="48"
      flex="none"
      bg="bg.well"
      borderRightWidth="1px"
      borderColor="line"
      px="6"
      py="5"
      h="100dvh"
      position="sticky"
      top="0"
      overflowY="auto"
    >
      <Box fontWeight="700" fontSize="lead" mb="4">
        {name}
      </Box>
      <Flex as="nav" aria-label="Darkroom" direction="column" flex="1">
        {places.map((place, index) => (
          <Flex direction="column" key={place.words}>
            {place.group && place.group !== places[index - 1]?.group && (
              <Box color="ink.muted" fontSize="small" mt="3">
                {place.group}
              </Box>
            )}
            <PlaceLink
              to={place.to(address)}
              words={place.words}
              current={isAt(pathname, place.to(address))}
              count={place.words === 'Needs you' ? needsYou : undefined}
            />
          </Flex>
        ))}
        <Box flex="1" minH="4" />
        <CodeBox />
        <Box mt="3">
          <PlaceLink
            to={paths.more(address)}
            words={me.displayName}
            current={isAt(pathname, paths.more(address))}
          />
        </Box>
        <Box color="ink.muted" fontSize="small">
          {me.role}
        </Box>
      </Flex>
    </Flex>
  );
}
