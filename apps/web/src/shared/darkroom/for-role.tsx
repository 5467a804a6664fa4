import { Box } from '@chakra-ui/react';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { MemberRole } from '../api/types.js';
import { listOf } from '../formats/amounts.js';
import { paths } from '../routes/paths.js';
import { ButtonLink } from '../ui/links.js';
import { PageHeading } from '../ui/page-heading.js';
import { useDarkroom, useMay } from './darkroom-context.js';
import { peopleQuery } from './people.query.js';
import { atLeast } from './roles.js';

interface Props {
  least: MemberRole;
  /** 'Mixing': how the sentence begins. */
  what: string;
  children: ReactNode;
}

function NotAllowed({ least, what }: Omit<Props, 'children'>) {
  const { address } = useDarkroom();
  const { data } = useQuery(peopleQuery(address));
  const names = (data ?? [])
    .filter((person) => atLeast(person.role, least))
    .map((person) => person.displayName);
  return (
    <>
      <PageHeading title={`${what} is for ${least}s.`} />
      {names.length > 0 && <Box mb="4">Ask {listOf(names, 'or')}.</Box>}
      <ButtonLink to={paths.sink(address)}>To the sink</ButtonLink>
    </>
  );
}

/** The page for those whose role allows it; for others, whom to ask. */
export function ForRole({ least, what, children }: Props) {
  return useMay(least) ? <>{children}</> : <NotAllowed least={least} what={what} />;
}
