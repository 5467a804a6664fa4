import { chakra } from '@chakra-ui/react';
import { Fragment, type ReactNode } from 'react';

const code = /\b([A-Z][A-Z0-9]{1,5}-\d{2,})\b/;

/** Running text in which the code of a bottle stays on one line: 'FX-' and '01' are nothing apart. */
export function CodeWords({ children }: { children: ReactNode }) {
  if (typeof children !== 'string') return children;
  return children.split(code).map((part, at) =>
    at % 2 === 1 ? (
      <chakra.span key={at} whiteSpace="nowrap">
        {part}
      </chakra.span>
    ) : (
      <Fragment key={at}>{part}</Fragment>
    ),
  );
}
