import { Box, Button, chakra, Flex, Stack } from '@chakra-ui/react';
import { useState } from 'react';
import { newId } from '../../../shared/actions/send-action.js';
import { showStrip } from '../../../shared/actions/strip.store.js';
import { isUncertain, wordsOf } from '../../../shared/api/problem.js';
import type { OrderView } from '../../../shared/api/types.js';
import { useMay } from '../../../shared/darkroom/darkroom-context.js';
import { showMoney } from '../../../shared/formats/amounts.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { SectionHeading } from '../../../shared/ui/page-heading.js';
import { usePutOrderSending } from '../api/put-order-sending.js';

interface Props {
  order: OrderView;
  mailText: string | null;
  /** The draft has changes that are not saved: what would go out is not what is seen. */
  unsaved: boolean;
}

const packsOf = (order: OrderView): string => {
  const packs = order.lines.reduce((sum, line) => sum + line.count, 0);
  return `${packs} ${packs === 1 ? 'pack' : 'packs'}`;
};

/** Not undoable, so it is asked once, and what goes is named. */
const goesWords = (order: OrderView): string =>
  `Send order ${order.numberText} to ${order.supplier.email}: ${packsOf(order)}, ${showMoney(order.totalMinor, order.currency)}? It cannot be taken back.`;

/** The mail as it would go out, and the button that sends it. */
export function SendOrder({ order, mailText, unsaved }: Props) {
  const maySend = useMay('manager');
  const sending = usePutOrderSending();
  const [actionId, setActionId] = useState(newId);
  const [problem, setProblem] = useState<string>();
  const [asked, setAsked] = useState(false);
  const asking = asked && !unsaved;
  const send = async (): Promise<void> => {
    setProblem(undefined);
    try {
      await sending.sendAndWait(actionId, { orderId: order.id, revision: order.revision });
      const words = `Order ${order.numberText} is on its way to ${order.supplier.email}.`;
      showStrip({ actionId, state: 'done', words, canUndo: false });
    } catch (error) {
      setProblem(wordsOf(error));
      // While nobody knows whether it went, only the same sending may be tried again: two ids could be two orders.
      if (!isUncertain(error)) setActionId(newId());
    }
  };
  return (
    <section aria-labelledby="mail">
      <SectionHeading id="mail">The mail</SectionHeading>
      <Box color="ink.muted">To {order.supplier.email}, answers come to whoever sends it.</Box>
      {mailText && (
        <chakra.pre
          whiteSpace="pre-wrap"
          bg="surface"
          borderWidth="1px"
          borderColor="line"
          borderRadius="control"
          p="3"
          my="3"
          fontFamily="body"
        >
          {mailText}
        </chakra.pre>
      )}
      <FormError message={problem} />
      {!maySend && <Box>A manager sends it.</Box>}
      {maySend && unsaved && (
        <Box fontWeight="600">Save the draft first: this mail does not have your changes.</Box>
      )}
      {maySend && !asking && (
        <Button minH="13" whiteSpace="normal" disabled={unsaved} onClick={() => setAsked(true)}>
          Send the order
        </Button>
      )}
      {maySend && asking && (
        <Stack gap="3">
          <Box fontWeight="600">{goesWords(order)}</Box>
          <Flex gap="3" wrap="wrap">
            <Button
              minH="13"
              whiteSpace="normal"
              loading={sending.isPending}
              loadingText="Sending"
              onClick={() => void send()}
            >
              Send {packsOf(order)}
            </Button>
            <Button variant="outline" minH="13" onClick={() => setAsked(false)}>
              Not yet
            </Button>
          </Flex>
        </Stack>
      )}
    </section>
  );
}
