import { Box, Button, Stack } from '@chakra-ui/react';
import { type FormEvent, type KeyboardEvent, type RefObject, useRef } from 'react';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { equivalence, filmPhrase, isSized } from '../../../shared/formats/film-words.js';
import { paths } from '../../../shared/routes/paths.js';
import { CodeWords } from '../../../shared/ui/code-words.js';
import { TextLink } from '../../../shared/ui/links.js';
import type { Standing } from '../../bottles/standing.js';
import { usePutLoad } from '../api/put-load.js';
import { planLoad } from '../load-plan.js';
import { rememberChoice } from '../remembered-choice.js';
import { useLoadChoice } from '../use-load-choice.js';
import type { OpenLoad } from '../use-load-sheet.js';
import { BathChips } from './bath-chips.js';
import { CountStepper } from './count-stepper.js';
import { FilmChoice } from './film-choice.js';
import { LoadPreview } from './load-preview.js';

interface Props {
  load: OpenLoad;
  baths: readonly Standing[];
  onDone: () => void;
  confirmRef: RefObject<HTMLButtonElement | null>;
}

const isTyping = (target: EventTarget): boolean =>
  target instanceof HTMLInputElement && target.type !== 'radio';

export function LoadForm({ load, baths, onDone, confirmRef }: Props) {
  const { me, address } = useDarkroom();
  const choice = useLoadChoice(me.membershipId, load);
  const putLoad = usePutLoad((id) => baths.find(({ bottle }) => bottle.id === id)?.document);
  const confirmed = useRef(false);
  const { film } = choice;
  const plan = planLoad({ baths, film, picks: choice.picks });
  const isIn = (bath: Standing): boolean => plan.through.includes(bath);
  const [only] = baths;

  const confirm = (event: FormEvent): void => {
    event.preventDefault();
    // Confirmed once: a second press of a double tap finds nothing to do.
    if (confirmed.current || plan.button === null) return;
    confirmed.current = true;
    rememberChoice(me.membershipId, film);
    const content = {
      bottleIds: plan.through.map(({ bottle }) => bottle.id),
      material: 'film' as const,
      film: [film],
      ...(plan.isReport && { reported: true }),
    };
    const verb = film.count === 1 ? 'is' : 'are';
    const words = plan.isReport ? `${filmPhrase(film)} ${verb} reported.` : `${filmPhrase(film)} ${verb} in.`;
    putLoad.send(load.actionId, content, { words, undone: `Undone: ${filmPhrase(film)}.` });
    onDone();
  };
  const typeDigit = (event: KeyboardEvent): void => {
    if (/^[1-9]$/.test(event.key) && !isTyping(event.target)) choice.setCount(Number(event.key));
  };
  const equal = isSized(film) ? equivalence(film) : 'Say its width and height.';

  return (
    <form onSubmit={confirm} onKeyDown={typeDigit}>
      <Stack gap="3">
        {load.bottleIds.length > 1 ? (
          <BathChips baths={baths} isIn={isIn} onToggle={(bath) => choice.toggle(bath, isIn(bath))} />
        ) : (
          only && (
            <TextLink to={paths.bottle(address, only.bottle.code)}>
              <CodeWords>{`All about ${only.bottle.code}`}</CodeWords>
            </TextLink>
          )
        )}
        <CountStepper count={film.count} format={film.format} onChange={choice.setCount} />
        {equal && <Box color="ink.muted">{equal}</Box>}
        <FilmChoice film={film} onChange={choice.setFilm} />
        <LoadPreview plan={plan} several={load.bottleIds.length > 1} onReport={choice.report} />
        {plan.button && (
          <Button
            ref={confirmRef}
            type="submit"
            minH="15"
            h="auto"
            py="2"
            fontWeight="700"
            whiteSpace="normal"
          >
            <CodeWords>{plan.button}</CodeWords>
          </Button>
        )}
      </Stack>
    </form>
  );
}
