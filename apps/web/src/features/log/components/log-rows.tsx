import { Box, chakra, Flex } from '@chakra-ui/react';
import { type LocalDate } from '@wetside/chemistry';
import type { LogEntry } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { showInstant, showTime } from '../../../shared/formats/instants.js';
import { paths } from '../../../shared/routes/paths.js';
import { CodeWords } from '../../../shared/ui/code-words.js';
import { TextLink } from '../../../shared/ui/links.js';
import { Tape } from '../../../shared/ui/tape.js';
import { flagWords } from '../flag-words.js';
import { TakeBack } from './take-back.js';

interface Props {
  label: string;
  entries: readonly LogEntry[];
  today: LocalDate;
}

function voidWords({ action }: LogEntry, zone: string): string | null {
  const by = action.voidedBy;
  if (!by) return null;
  const who = by.displayName === action.by.displayName ? '' : ` by ${by.displayName}`;
  return `voided ${showTime(by.at, zone)}${who}${by.reason ? `, ${by.reason}` : ''}`;
}

function Row({ entry, today }: { entry: LogEntry; today: LocalDate }) {
  const { zone, address } = useDarkroom();
  const { action, sentence } = entry;
  const gone = voidWords(entry, zone);
  return (
    <Flex
      as="li"
      gap="3"
      rowGap="1"
      wrap="wrap"
      py="2"
      minH="11"
      align="center"
      borderTopWidth="1px"
      borderColor="line"
    >
      <Box color="ink.muted" w="9.5rem">
        {showInstant(action.happenedAt, zone, today)}
      </Box>
      <Box flex="1 1 14rem" minW="0">
        <chakra.span textDecoration={gone ? 'line-through' : 'none'}>
          {action.by.displayName}: <CodeWords>{sentence}</CodeWords>
        </chakra.span>
        {gone && <Box color="ink.muted">↳ {gone}</Box>}
        {entry.flags.length > 0 && <Box color="ink.muted">{entry.flags.map(flagWords).join(', ')}</Box>}
      </Box>
      <Flex gap="2" wrap="wrap">
        {entry.codes.map((code) => (
          <TextLink
            key={code}
            to={paths.bottle(address, code)}
            display="inline-flex"
            alignItems="center"
            minH="11"
          >
            <Tape>{code}</Tape>
          </TextLink>
        ))}
      </Flex>
      {action.canUndo && !action.voidedBy && <TakeBack entry={entry} />}
    </Flex>
  );
}

/** What happened, newest first. A voided row stays, struck through and hooked to its void. */
export function LogRows({ label, entries, today }: Props) {
  if (entries.length === 0) return <Box>Nothing has happened yet.</Box>;
  return (
    <chakra.ul listStyleType="none" aria-label={label}>
      {entries.map((entry) => (
        <Row key={entry.action.id} entry={entry} today={today} />
      ))}
    </chakra.ul>
  );
}
