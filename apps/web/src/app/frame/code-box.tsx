import { Input } from '@chakra-ui/react';
import { type FormEvent, useEffect, useRef } from 'react';
import { useNavigate } from 'react-router-dom';
import { useDarkroom } from '../../shared/darkroom/darkroom-context.js';
import { paths } from '../../shared/routes/paths.js';

const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement && target.closest('input, textarea, select, [role=dialog]') !== null;

/** Type a bottle's code and go to it; the key / leads here. */
export function CodeBox() {
  const box = useRef<HTMLInputElement>(null);
  const navigate = useNavigate();
  const { address } = useDarkroom();
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      if (event.key !== '/' || isTyping(event.target)) return;
      event.preventDefault();
      box.current?.focus();
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, []);
  const go = (event: FormEvent): void => {
    event.preventDefault();
    const code = box.current?.value.trim().toUpperCase();
    if (!code || !box.current) return;
    box.current.value = '';
    void navigate(paths.bottle(address, code));
  };
  return (
    <form onSubmit={go} role="search">
      <Input
        ref={box}
        aria-label="A bottle’s code"
        placeholder="Code  /"
        minH="11"
        bg="surface"
        borderColor="field"
      />
    </form>
  );
}
