import { lazy, type ReactNode, Suspense, useCallback, useEffect, useMemo, useRef, useState } from 'react';
import { isTyping, type KeyBinding, KeysContext } from './keys-context';

const KeysDialog = lazy(() => import('./keys-dialog'));

/** One listener for all single-key commands, and the list of them behind `?`. */
export function KeysProvider({ children }: { children: ReactNode }) {
  const [bindings, setBindings] = useState<KeyBinding[]>([]);
  const [isListOpen, setListOpen] = useState(false);
  const current = useRef(bindings);
  useEffect(() => {
    current.current = bindings;
  }, [bindings]);

  const add = useCallback((binding: KeyBinding) => {
    setBindings((all) => [...all, binding]);
    return () => setBindings((all) => all.filter((other) => other !== binding));
  }, []);

  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target)) return;
      // an open dialog has the keyboard for itself
      if (document.querySelector('[role="dialog"],[role="alertdialog"]')) return;
      if (event.key === '?') return setListOpen(true);
      // the page opened last goes first
      const binding = current.current.findLast(({ key }) => key === event.key);
      if (!binding) return;
      event.preventDefault();
      binding.run(event);
    };
    addEventListener('keydown', listen);
    return () => removeEventListener('keydown', listen);
  }, []);

  const value = useMemo(() => ({ bindings, add }), [bindings, add]);
  return (
    <KeysContext value={value}>
      {children}
      {isListOpen && (
        <Suspense>
          <KeysDialog bindings={bindings} onClose={() => setListOpen(false)} />
        </Suspense>
      )}
    </KeysContext>
  );
}
