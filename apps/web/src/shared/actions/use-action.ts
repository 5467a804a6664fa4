import { onlineManager, type QueryClient, useMutation, useQueryClient } from '@tanstack/react-query';
import { useRef } from 'react';
import { isPassing, isUncertain, wordsOf } from '../api/problem.js';
import { keptKey, type Kept } from '../api/query-keys.js';
import type { ActionAnswer } from '../api/types.js';
import { useDarkroom } from '../darkroom/darkroom-context.js';
import { addPending, type BottleChange, type PendingAction, removePending } from './pending.store.js';
import { type PutAction, sendAction, tell, type Told } from './send-action.js';
import { orNoSignal } from './or-no-signal.js';
import { showStrip, updateStrip } from './strip.store.js';
import { rememberBefore } from './undo-memory.js';

/** What every action of the program says about itself; the recipe below does the rest. */
export interface ActionRecipe<Content, Answer extends ActionAnswer> {
  put: PutAction<Content, Answer>;
  /** What it does to bottles, shown before the server has answered. */
  changes?(content: Content): BottleChange[];
  restores?(content: Content): PendingAction['restores'];
  /** Puts the server's answer in the place of what was shown. */
  settle?(client: QueryClient, darkroom: string, answer: Answer): void;
  /** What is fetched again afterwards. */
  touches: readonly Kept[];
}

export interface SendOptions {
  /** The sentence of the strip, shown at once. Without it the caller speaks for itself. */
  words?: string;
  canUndo?: boolean;
  undone?: string;
}

interface Sending<Content> {
  told: Told<Content>;
  content: Content;
  options: SendOptions;
}

const TRIES_AGAIN = 4;
const waitMs = (failures: number): number => Math.min(400 * 2 ** failures, 6_000);

/**
 * The one recipe for doing something: the change shows at once, goes out under an id made beforehand, is sent
 * again under the same id while nobody knows whether it arrived, gives way to the server's answer, and is
 * taken back with the server's sentence when that says no. Actions of a darkroom go out one after another.
 */
export function useAction<Content extends object, Answer extends ActionAnswer>(
  recipe: ActionRecipe<Content, Answer>,
) {
  const client = useQueryClient();
  const { address: darkroom } = useDarkroom();

  const mutation = useMutation<Answer, Error, Sending<Content>>({
    scope: { id: `actions of ${darkroom}` },
    mutationFn: ({ told }) => sendAction(recipe.put, darkroom, told),
    retry: (failures, error) => isPassing(error) && failures < TRIES_AGAIN,
    retryDelay: waitMs,
    onMutate: ({ told, content, options }) => {
      const changes = recipe.changes?.(content) ?? [];
      const restores = recipe.restores?.(content);
      rememberBefore(client, darkroom, told.actionId, changes);
      addPending({ actionId: told.actionId, darkroom, changes, ...(restores && { restores }) });
      if (options.words) {
        showStrip({
          actionId: told.actionId,
          state: 'sending',
          words: options.words,
          canUndo: options.canUndo ?? true,
          undone: options.undone,
        });
      }
    },
    onSuccess: (answer, { told }) => {
      recipe.settle?.(client, darkroom, answer);
      removePending(told.actionId);
      updateStrip(told.actionId, { state: 'done', ...(!answer.action.canUndo && { canUndo: false }) });
      for (const kept of recipe.touches) void client.invalidateQueries({ queryKey: keptKey(darkroom, kept) });
    },
    onError: (error, sending) => {
      const { actionId } = sending.told;
      if (isUncertain(error)) {
        // It may have arrived: what is shown stays, and the same id is the only safe way to ask again.
        const again = (): void => mutation.mutate(sending);
        updateStrip(actionId, { state: 'unsent', why: wordsOf(error), again });
        return;
      }
      removePending(actionId);
      updateStrip(actionId, { state: 'refused', words: wordsOf(error), canUndo: false });
      // What was shown led to a thing that cannot be done: it is not how things are any more.
      for (const kept of recipe.touches) void client.invalidateQueries({ queryKey: keptKey(darkroom, kept) });
    },
  });

  const last = useRef<Sending<Content> | null>(null);
  const prepare = (actionId: string, content: Content, options: SendOptions): Sending<Content> => {
    const before = last.current;
    // Pressed again after a try that nobody answered: the same words at the same time, not a later one.
    const same =
      before?.told.actionId === actionId && JSON.stringify(before.content) === JSON.stringify(content);
    last.current = same ? before : { told: tell(actionId, content), content, options };
    return last.current;
  };
  const send = (actionId: string, content: Content, options: SendOptions): void =>
    mutation.mutate(prepare(actionId, content, options));
  const sendAndWait = (actionId: string, content: Content): Promise<Answer> =>
    orNoSignal(() => mutation.mutateAsync(prepare(actionId, content, {})));
  /**
   * Sends it from a sheet that stays open until the answer is there, so that a refusal finds what was typed. While
   * nobody knows what became of it the sheet may close: the strip keeps it, and sends the very same again.
   */
  const sendFromSheet = async (
    actionId: string,
    content: Content,
    options: SendOptions & { words: string },
  ): Promise<void> => {
    const { words, undone, canUndo = true } = options;
    if (!onlineManager.isOnline()) {
      send(actionId, content, options);
      return;
    }
    try {
      const { action } = await sendAndWait(actionId, content);
      showStrip({ actionId, state: 'done', words, undone, canUndo: canUndo && action.canUndo });
    } catch (error) {
      if (!isUncertain(error)) throw error;
      const again = (): void => mutation.mutate({ ...prepare(actionId, content, {}), options });
      showStrip({ actionId, state: 'unsent', words, undone, canUndo, why: wordsOf(error), again });
    }
  };
  return {
    /** Sends it and lets the strip speak. */
    send,
    /** Sends it for a form that waits for the answer. Rejects with ProblemError or NetworkError. */
    sendAndWait,
    /** Rejects with the ProblemError of a refusal, and with nothing else. */
    sendFromSheet,
    isPending: mutation.isPending,
  };
}
