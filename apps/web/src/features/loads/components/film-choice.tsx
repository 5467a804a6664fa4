import { Flex } from '@chakra-ui/react';
import { type FilmClass, filmClasses } from '@wetside/chemistry';
import type { FilmLine, FormatName } from '../../../shared/api/types.js';
import { classWords, formatWords } from '../../../shared/formats/film-words.js';
import { ChoiceChips } from '../../../shared/ui/choice-chips.js';
import { TextField } from '../../../shared/ui/text-field.js';

const formats = (Object.keys(formatWords) as FormatName[])
  .sort((a, b) => Number(a === 'sheet') - Number(b === 'sheet'))
  .map((value) => ({ value, label: formatWords[value] }));
const first: readonly FormatName[] = ['135-36', '120', '4x5'];
const inOrder = [
  ...formats
    .filter(({ value }) => first.includes(value))
    .sort((a, b) => first.indexOf(a.value) - first.indexOf(b.value)),
  ...formats.filter(({ value }) => !first.includes(value)),
];
const classes = filmClasses.map((value: FilmClass) => ({ value, label: classWords[value] }));

interface Props {
  film: FilmLine;
  onChange: (film: FilmLine) => void;
}

/** What film it is: its format and its class. */
export function FilmChoice({ film, onChange }: Props) {
  const size = (key: 'widthMm' | 'heightMm', text: string): void => {
    // Whole millimetres are recorded, and a part of one counts as one: film is never counted short.
    const mm = Math.ceil(Number(text));
    onChange({ ...film, [key]: mm > 0 ? mm : undefined });
  };
  return (
    <>
      <ChoiceChips
        legend="Format"
        options={inOrder}
        first={first.length}
        value={film.format}
        onChange={(format) => onChange({ format, count: film.count, filmClass: film.filmClass })}
      />
      {film.format === 'sheet' && (
        <Flex gap="3">
          <TextField
            label="Width"
            unit="mm"
            inputMode="decimal"
            defaultValue={film.widthMm}
            onChange={(event) => size('widthMm', event.target.value)}
          />
          <TextField
            label="Height"
            unit="mm"
            inputMode="decimal"
            defaultValue={film.heightMm}
            onChange={(event) => size('heightMm', event.target.value)}
          />
        </Flex>
      )}
      <ChoiceChips
        legend="Film"
        options={classes}
        first={2}
        value={film.filmClass}
        onChange={(filmClass) => onChange({ ...film, filmClass })}
      />
    </>
  );
}
