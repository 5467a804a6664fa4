import { Box, chakra, Flex } from '@chakra-ui/react';
import { useQuery } from '@tanstack/react-query';
import { Suspense, useEffect, useMemo } from 'react';
import { Outlet, useLocation, useParams } from 'react-router-dom';
import { useNeedsYou } from '../../features/alerts/api/get-needs-you.js';
import { ActionStrip } from '../../shared/actions/action-strip.js';
import type { Darkroom } from '../../shared/api/types.js';
import { DarkroomProvider, useMay } from '../../shared/darkroom/darkroom-context.js';
import { darkroomQuery } from '../../shared/darkroom/darkroom.query.js';
import { rememberDarkroom } from '../../shared/darkroom/last-darkroom.js';
import { paths } from '../../shared/routes/paths.js';
import { Fetched } from '../../shared/ui/fetched.js';
import { Waiting } from '../../shared/ui/waiting.js';
import { PhoneTabs } from './phone-tabs.js';
import { Rail } from './rail.js';

const SkipLink = chakra('a', {
  base: {
    position: 'absolute',
    left: '-999rem',
    bg: 'surface',
    color: 'ink',
    p: '3',
    zIndex: 'skipNav',
    _focus: { left: '2', top: '2' },
  },
});

function Framed({ address }: { address: string }) {
  const { pathname } = useLocation();
  const needsYou = useNeedsYou(useMay('technician')).data?.open.length;
  useEffect(() => {
    window.scrollTo(0, 0);
  }, [pathname]);
  return (
    <Flex minH="100dvh">
      <SkipLink href="#main">To the page</SkipLink>
      <Rail needsYou={needsYou} />
      <Box flex="1" minW="0">
        <Box
          as="main"
          id="main"
          px={{ base: '4', lg: '9' }}
          pt={{ base: '3', lg: '6' }}
          pb={{ base: '20', lg: '8' }}
          maxW="76rem"
        >
          <ActionStrip over={pathname === paths.sink(address)} />
          <Suspense fallback={<Waiting what="the page" />}>
            <Outlet />
          </Suspense>
        </Box>
      </Box>
      <PhoneTabs needsYou={needsYou} />
    </Flex>
  );
}

function InDarkroom({ darkroom, address }: { darkroom: Darkroom; address: string }) {
  const current = useMemo(() => ({ ...darkroom, address }), [darkroom, address]);
  useEffect(() => rememberDarkroom(darkroom.shortName), [darkroom.shortName]);
  return (
    <DarkroomProvider value={current}>
      <Framed key={address} address={address} />
    </DarkroomProvider>
  );
}

/** The frame of every page of one darkroom. */
export function DarkroomFrame() {
  const { darkroom: address = '' } = useParams();
  const query = useQuery(darkroomQuery(address));
  if (query.data) return <InDarkroom darkroom={query.data} address={address} />;
  return (
    <Box as="main" p="4">
      <Fetched query={query} what="the darkroom" missing="darkroom">
        {() => null}
      </Fetched>
    </Box>
  );
}
