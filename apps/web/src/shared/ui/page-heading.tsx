import { Box, chakra, Flex } from '@chakra-ui/react';
import { type ReactNode, useEffect } from 'react';
import { CodeWords } from './code-words.js';

interface Props {
  title: string;
  /** A sentence that a person would say. */
  says?: ReactNode;
  children?: ReactNode;
}

/** Every page begins with its name and a sentence; the page's own buttons stand beside them. */
export function PageHeading({ title, says, children }: Props) {
  useEffect(() => {
    document.title = `${title} · Wetside`;
  }, [title]);
  return (
    <Flex wrap="wrap" gap="3" align="flex-end" justify="space-between" mb="5">
      <Box flex="1 1 16rem" minW="0">
        <chakra.h1 fontSize={{ base: 'figure', lg: 'title' }} fontWeight="700" lineHeight="1.2">
          <CodeWords>{title}</CodeWords>
        </chakra.h1>
        {says && (
          <Box fontSize="lead" color="ink.muted">
            <CodeWords>{says}</CodeWords>
          </Box>
        )}
      </Box>
      {children && (
        <Flex gap="3" wrap="wrap">
          {children}
        </Flex>
      )}
    </Flex>
  );
}

export function SectionHeading({ children, id }: { children: ReactNode; id?: string }) {
  return (
    <chakra.h2 id={id} fontSize="lead" fontWeight="700" mt="6" mb="2">
      {children}
    </chakra.h2>
  );
}
