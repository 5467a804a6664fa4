import { Button, Dialog, Portal } from '@chakra-ui/react';
import type { ReactNode, RefObject } from 'react';
import { CodeWords } from './code-words.js';

interface Props {
  open: boolean;
  onClose: () => void;
  title: ReactNode;
  children: ReactNode;
  /** What is focused when it opens. */
  focusFirst?: RefObject<HTMLElement | null>;
}

/** From below on a phone, a panel at the right on a desk. The page behind stays where it was. */
export function Sheet({ open, onClose, title, children, focusFirst }: Props) {
  return (
    <Dialog.Root
      open={open}
      onOpenChange={(details) => !details.open && onClose()}
      lazyMount
      unmountOnExit
      {...(focusFirst && { initialFocusEl: () => focusFirst.current })}
    >
      <Portal>
        <Dialog.Backdrop />
        <Dialog.Positioner
          alignItems={{ base: 'flex-end', lg: 'stretch' }}
          justifyContent={{ base: 'center', lg: 'flex-end' }}
          overflow="hidden"
        >
          <Dialog.Content
            m="0"
            w="100%"
            maxW={{ base: '100%', lg: '420px' }}
            maxH="100dvh"
            overflowY="auto"
            bg="surface"
            boxShadow="none"
            borderRadius="0"
            borderTopRadius={{ base: 'tray', lg: '0' }}
            pb="env(safe-area-inset-bottom)"
          >
            <Dialog.Header alignItems="center" justifyContent="space-between" px="4" py="2">
              <Dialog.Title fontSize="lead" fontWeight="700">
                <CodeWords>{title}</CodeWords>
              </Dialog.Title>
              <Dialog.CloseTrigger asChild position="static">
                <Button variant="plain" minH="11" minW="11">
                  Close
                </Button>
              </Dialog.CloseTrigger>
            </Dialog.Header>
            <Dialog.Body px="4" pb="4" pt="0">
              {children}
            </Dialog.Body>
          </Dialog.Content>
        </Dialog.Positioner>
      </Portal>
    </Dialog.Root>
  );
}
