import { Box } from '@chakra-ui/react';
import { type ReactNode, useEffect, useState } from 'react';

interface Props {
  /** 'the sink': what is being fetched. */
  what: string;
  /** Outlines at the true size of what will stand there. */
  children?: ReactNode;
}

const SAY_SO_MS = 1_000;
const SLOW_MS = 8_000;

/** Says nothing for a second, then what it is fetching, then that it is slow. */
export function Waiting({ what, children }: Props) {
  const [stage, setStage] = useState(0);
  useEffect(() => {
    const timers = [setTimeout(() => setStage(1), SAY_SO_MS), setTimeout(() => setStage(2), SLOW_MS)];
    return () => timers.forEach(clearTimeout);
  }, []);
  return (
    <Box aria-busy="true">
      {children}
      <Box role="status" color="ink.muted" minH="6" py="3">
        {stage === 1 && `Fetching ${what}`}
        {stage === 2 && `Slow today. Still fetching ${what}`}
      </Box>
    </Box>
  );
}
