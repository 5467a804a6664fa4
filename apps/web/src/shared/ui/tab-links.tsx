import { chakra, Flex } from '@chakra-ui/react';
import { Link } from 'react-router-dom';

const Tab = chakra(Link, {
  base: {
    display: 'inline-flex',
    alignItems: 'center',
    minH: '11',
    px: '3',
    color: 'ink.muted',
    borderBottomWidth: '3px',
    borderColor: 'transparent',
    '&[aria-current]': { color: 'ink', fontWeight: '700', borderColor: 'brand' },
  },
});

interface Props {
  label: string;
  tabs: readonly { to: string; words: string; current: boolean }[];
}

/** Parts of one page, each with an address of its own. */
export function TabLinks({ label, tabs }: Props) {
  return (
    <Flex as="nav" aria-label={label} wrap="wrap" mb="4" borderBottomWidth="1px" borderColor="rule">
      {tabs.map((tab) => (
        <Tab key={tab.to} to={tab.to} aria-current={tab.current ? 'page' : undefined}>
          {tab.words}
        </Tab>
      ))}
    </Flex>
  );
}
