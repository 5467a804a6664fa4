import { Button, type ButtonProps, chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';

export const TextLink = chakra(Link, {
  base: {
    textDecoration: 'underline',
    textUnderlineOffset: '3px',
    _hover: { textDecorationThickness: '2px' },
  },
});

interface Props extends Pick<ButtonProps, 'variant' | 'w'> {
  to: string;
  children: ReactNode;
}

/** A way to somewhere else, with a button's size. */
export function ButtonLink({ to, children, variant = 'outline', w }: Props) {
  return (
    <Button asChild variant={variant} minH="11" whiteSpace="normal" height="auto" py="2" w={w}>
      <Link to={to}>{children}</Link>
    </Button>
  );
}
