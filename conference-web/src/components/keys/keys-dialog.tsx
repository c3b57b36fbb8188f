import { Button, Dialog, Flex, Kbd } from '@radix-ui/themes';
import type { KeyBinding } from './keys-context';

const SHOWN: Record<string, string> = { ArrowLeft: '←', ArrowRight: '→', ArrowUp: '↑', ArrowDown: '↓', ' ': 'Space' };

/** The list of keys that work on this page. */
export default function KeysDialog({ bindings, onClose }: { bindings: KeyBinding[]; onClose: () => void }) {
  const rows = [...new Map(bindings.map(({ key, does }) => [key, does])), ['?', 'This list'] as const];
  return (
    <Dialog.Root open onOpenChange={(open) => !open && onClose()}>
      <Dialog.Content maxWidth="420px">
        <Dialog.Title size="4">Keys on this page</Dialog.Title>
        <Dialog.Description size="2">Everything can also be reached with Tab and Enter.</Dialog.Description>
        <table style={{ margin: '12px 0', borderSpacing: '0 6px' }}>
          <tbody>
            {rows.map(([key, does]) => (
              <tr key={key}>
                <th scope="row" style={{ textAlign: 'left', paddingRight: 20 }}>
                  <Kbd size="3">{SHOWN[key] ?? key}</Kbd>
                </th>
                <td>{does}</td>
              </tr>
            ))}
          </tbody>
        </table>
        <Flex justify="end">
          <Dialog.Close>
            <Button variant="soft">Close</Button>
          </Dialog.Close>
        </Flex>
      </Dialog.Content>
    </Dialog.Root>
  );
}
