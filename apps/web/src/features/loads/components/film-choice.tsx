import { Flex } from '@chakra-ui/react';
import { type FilmClass, filmClasses } from '@wetside/chemistry';
import { useState } from 'react';
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

/** The most that the server takes of a side. */
const MOST_MM = 2_000;

interface SideProps {
  label: string;
  mm: number | undefined;
  onChange: (mm: number | undefined) => void;
}

/** One side of a sheet, as typed. Whole millimetres are recorded, a part of one as one: film is never counted short. */
function Side({ label, mm, onChange }: SideProps) {
  const [typed, setTyped] = useState(mm === undefined ? '' : String(mm));
  const wrong = typed.trim() !== '' && mm === undefined;
  const type = (text: string): void => {
    setTyped(text);
    // Three figures after a comma are thousands to somebody: asked again, not guessed.
    const size = /^\d{1,4}([.,]\d{1,2})?$/.test(text.trim()) ? Math.ceil(Number(text.replace(',', '.'))) : 0;
    onChange(size >= 1 && size <= MOST_MM ? size : undefined);
  };
  return (
    <TextField
      label={label}
      unit="mm"
      inputMode="decimal"
      error={wrong ? `A number of mm, 1 to ${MOST_MM}.` : undefined}
      value={typed}
      onChange={(event) => type(event.target.value)}
    />
  );
}

/** What film it is: its format and its class. */
export function FilmChoice({ film, onChange }: Props) {
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
          <Side label="Width" mm={film.widthMm} onChange={(widthMm) => onChange({ ...film, widthMm })} />
          <Side label="Height" mm={film.heightMm} onChange={(heightMm) => onChange({ ...film, heightMm })} />
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
