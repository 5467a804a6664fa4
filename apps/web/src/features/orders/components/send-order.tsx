import { Box, Button, chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { newId } from '../../../shared/actions/send-action.js';
import { showStrip } from '../../../shared/actions/strip.store.js';
import { wordsOf } from '../../../shared/api/problem.js';
import type { OrderView } from '../../../shared/api/types.js';
import { useMay } from '../../../shared/darkroom/darkroom-context.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { SectionHeading } from '../../../shared/ui/page-heading.js';
import { usePutOrderSending } from '../api/put-order-sending.js';

interface Props {
  order: OrderView;
  mailText: string | null;
}

/** The mail as it would go out, and the button that sends it. */
export function SendOrder({ order, mailText }: Props) {
  const maySend = useMay('manager');
  const sending = usePutOrderSending();
  const [actionId, setActionId] = useState(newId);
  const [problem, setProblem] = useState<string>();
  const send = async (): Promise<void> => {
    setProblem(undefined);
    try {
      await sending.sendAndWait(actionId, { orderId: order.id, revision: order.revision });
      const words = `Order ${order.numberText} is on its way to ${order.supplier.email}.`;
      showStrip({ actionId, state: 'done', words, canUndo: false });
    } catch (error) {
      setProblem(wordsOf(error));
      setActionId(newId());
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
      {maySend ? (
        <Button
          minH="13"
          whiteSpace="normal"
          loading={sending.isPending}
          loadingText="Sending"
          onClick={() => void send()}
        >
          Send the order
        </Button>
      ) : (
        <Box>A manager sends it.</Box>
      )}
    </section>
  );
}
