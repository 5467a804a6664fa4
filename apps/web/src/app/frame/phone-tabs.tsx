import { Flex } from '@chakra-ui/react';
import { useLocation } from 'react-router-dom';
import { useDarkroom } from '../../shared/darkroom/darkroom-context.js';
import { paths } from '../../shared/routes/paths.js';
import { PlaceLink } from './place-link.js';
import { isAt, phoneTabs, railPlaces } from './places.js';

/** The phone's way about: words at the foot, 56 px high. */
export function PhoneTabs({ needsYou }: { needsYou: number | undefined }) {
  const { address, me } = useDarkroom();
  const { pathname } = useLocation();
  const tabs = phoneTabs(me.role);
  const behindMore = railPlaces(me.role).filter(({ onPhone }) => onPhone === 'more');
  const atMore = [paths.more(address), ...behindMore.map(({ to }) => to(address))].some((to) =>
    isAt(pathname, to),
  );
  return (
    <Flex
      as="nav"
      aria-label="Darkroom"
      hideFrom="lg"
      position="fixed"
      bottom="0"
      insetX="0"
      minH="14"
      bg="bg"
      borderTopWidth="1px"
      borderColor="line"
      justify="space-around"
      align="center"
      pb="env(safe-area-inset-bottom)"
      zIndex="docked"
    >
      {tabs.map(({ words, to }) => (
        <PlaceLink
          key={words}
          to={to(address)}
          words={words}
          current={isAt(pathname, to(address))}
          count={words === 'Needs you' ? needsYou : undefined}
        />
      ))}
      <PlaceLink to={paths.more(address)} words="More" current={atMore} />
    </Flex>
  );
}
