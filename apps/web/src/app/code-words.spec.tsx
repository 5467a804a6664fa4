import { render, screen } from '@testing-library/react';
import { expect, it } from 'vitest';
import { Providers } from './providers.js';
import { createQueryClient } from './query-client.js';
import { CodeWords } from '../shared/ui/code-words.js';

it('keeps a code on one line, and the words as they were', () => {
  render(
    <Providers client={createQueryClient()}>
      <button>
        <CodeWords>Put 2 rolls through FX-01, then FX-02.</CodeWords>
      </button>
    </Providers>,
  );
  const button = screen.getByRole('button', { name: 'Put 2 rolls through FX-01, then FX-02.' });
  const codes = [...button.querySelectorAll('span')];
  expect(codes.map((one) => one.textContent)).toEqual(['FX-01', 'FX-02']);
  expect(codes.map((one) => getComputedStyle(one).whiteSpace)).toEqual(['nowrap', 'nowrap']);
});
