import { Button } from '@chakra-ui/react';
import { useState } from 'react';
import type { NeedsYouRow } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { paths } from '../../../shared/routes/paths.js';
import { ButtonLink } from '../../../shared/ui/links.js';
import { DecideSheet } from './decide-sheet.js';

function Decide({ load }: { load: NonNullable<NeedsYouRow['load']> }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button variant="outline" minH="11" w={{ base: '100%', md: 'auto' }} onClick={() => setOpen(true)}>
        Decide
      </Button>
      <DecideSheet load={load} open={open} onClose={() => setOpen(false)} />
    </>
  );
}

/** The one verb of a row: what to do about it, and where. */
export function EventVerb({ row }: { row: NeedsYouRow }) {
  const { address } = useDarkroom();
  const { bottle, pack, load, verb } = row;
  const wide = { base: '100%', md: 'auto' };
  if (verb === 'decide' && load) return <Decide load={load} />;
  if (verb === 'order') {
    return (
      <ButtonLink to={paths.orders(address)} w={wide}>
        Order {pack?.name ?? ''}
      </ButtonLink>
    );
  }
  if (!bottle)
    return pack ? (
      <ButtonLink to={paths.shelf(address)} w={wide}>
        Look at the shelf
      </ButtonLink>
    ) : null;
  if (verb === 'mix') {
    return (
      <ButtonLink to={paths.mixLike(address, bottle.code)} w={wide}>
        Mix {bottle.name}
      </ButtonLink>
    );
  }
  const page = paths.bottle(address, bottle.code);
  if (verb === 'discard')
    return (
      <ButtonLink to={`${page}?do=discard`} w={wide}>
        Discard {bottle.code}
      </ButtonLink>
    );
  if (verb === 'release')
    return (
      <ButtonLink to={`${page}?do=release`} w={wide}>
        Release {bottle.code}
      </ButtonLink>
    );
  return (
    <ButtonLink to={page} w={wide}>
      Look at {bottle.code}
    </ButtonLink>
  );
}
