import { fireEvent, screen, waitFor } from '@testing-library/react';
import { beforeAll, describe, expect, it } from 'vitest';
import { fakeApi, type Handler } from '../testing/fake-api.js';
import { hurryTries, refusals, unknowns } from '../testing/failing.js';
import { type FormCase, formCases } from '../testing/form-cases.js';
import { renderAt } from '../testing/render-at.js';

beforeAll(hurryTries);

/** The form filled in, with an answer that the test changes as it goes. */
async function opened(form: FormCase) {
  const server: { answer: Handler } = { answer: () => ({ status: 500 }) };
  const api = fakeApi({ ...form.answers, [form.request]: (asked) => server.answer(asked) });
  renderAt(form.at);
  await form.fill();
  const [method = '', path = ''] = form.request.replace('*', '').split(' ');
  const sent = () =>
    api
      .sent(method)
      .filter((asked) => (path.endsWith('/') ? asked.path.startsWith(path) : asked.path === path));
  return { server, sent };
}
/** By its words alone: asking for roles reads all styles of the page, and this is asked some hundreds of times. */
function buttonOf(name: string): HTMLButtonElement {
  const found = [...document.querySelectorAll('button')].find(({ textContent }) => textContent === name);
  if (!found) throw new Error(`There is no button ${name}.`);
  return found;
}
/** Waits until the button is there and not busy, and presses it. */
async function press(name: string): Promise<void> {
  await waitFor(() => expect(buttonOf(name)).toBeEnabled());
  fireEvent.click(buttonOf(name));
}
async function isKept(form: FormCase): Promise<void> {
  await waitFor(() => expect(buttonOf(form.button)).toBeEnabled());
  for (const [label, text] of Object.entries(form.kept))
    expect(screen.getByLabelText(label)).toHaveValue(text);
}
const alerts = () => [...document.querySelectorAll('[role=alert]')].map(({ textContent }) => textContent);
const strip = () => screen.getByLabelText('What was just done');
const idAndContent = (asked: { path: string; body: unknown } | undefined) => [
  asked?.path,
  (asked?.body as { content?: unknown }).content ?? asked?.body,
];

describe.each(formCases.map((form) => [form.name, form] as const))('%s', (_, form) => {
  it('says the server’s refusal, keeps what was typed, and can be sent again', async () => {
    const { server, sent } = await opened(form);
    for (const [status, code, detail] of refusals) {
      const before = sent().length;
      server.answer = () => ({ status, body: { code, detail } });
      await press(form.button);
      await waitFor(() => expect(alerts()).toContain(detail));
      await isKept(form);
      expect(sent()).toHaveLength(before + 1);
    }
  });

  it('is kept, and sent again as the same, while nobody knows what became of it', async () => {
    const { server, sent } = await opened(form);
    for (const [status, code, detail] of form.strip ? unknowns.slice(-1) : unknowns) {
      const first = sent().length;
      server.answer = () => (status === 0 ? 'no signal' : { status, body: { code, detail } });
      await press(form.button);
      if (form.strip) {
        await waitFor(() => expect(strip()).toHaveTextContent(`${detail} Not sent yet: ${form.strip}`));
      } else {
        await waitFor(() => expect(alerts()).toContain(detail));
        await isKept(form);
      }
      const tries = sent().length - first;
      await press(form.strip ? 'Try again' : form.button);
      // All its tries, so that none of them is left for the next round.
      await waitFor(() => expect(sent()).toHaveLength(first + 2 * tries));
      expect(idAndContent(sent().at(-1))).toEqual(idAndContent(sent()[first]));
    }
  });

  const { objection } = form;
  if (objection) {
    it('puts the server’s objection at its field, and goes there', async () => {
      const { server } = await opened(form);
      const [field, label] = objection;
      const errors = [{ field, message: 'Not like this.' }];
      server.answer = () => ({ status: 400, body: { code: 'invalid', detail: 'Look here.', errors } });
      await press(form.button);
      const at = screen.getByLabelText(label);
      await waitFor(() => expect(at).toHaveAccessibleDescription(/Not like this\./));
      expect(at).toBeInvalid();
      expect(at).toHaveFocus();
      await isKept(form);
    });
  }

  if (form.bad.length > 0) {
    it('takes nothing that it must not, says so at the field, and sends nothing', async () => {
      const { sent } = await opened(form);
      for (const [label, text, words] of form.bad) {
        const at = screen.getByLabelText(label);
        const before = form.kept[label] ?? '';
        fireEvent.change(at, { target: { value: text } });
        await press(form.button);
        await waitFor(() =>
          expect(at).toHaveAccessibleDescription(expect.stringMatching(new RegExp(words.source, 'm'))),
        );
        expect(at).toBeInvalid();
        expect(at).toHaveFocus();
        expect(at).toHaveValue(text);
        fireEvent.change(at, { target: { value: before } });
      }
      expect(sent()).toHaveLength(0);
    });
  }
});
