import { Dialog } from '@radix-ui/themes';
import { type ReactNode, useState } from 'react';

interface FormDialogProps {
  trigger: ReactNode;
  title: string;
  description?: ReactNode;
  maxWidth?: string;
  /** Drawn only while it is open, so each opening begins with what is true then. */
  children: (close: () => void) => ReactNode;
}

/** A form over the page. */
export function FormDialog({ trigger, title, description, maxWidth = '520px', children }: FormDialogProps) {
  const [isOpen, setOpen] = useState(false);
  return (
    <Dialog.Root open={isOpen} onOpenChange={setOpen}>
      <Dialog.Trigger>{trigger}</Dialog.Trigger>
      {/* a click beside it must not lose what was typed */}
      <Dialog.Content maxWidth={maxWidth} onInteractOutside={(event) => event.preventDefault()} {...(description ? {} : { 'aria-describedby': undefined })}>
        <Dialog.Title size="4">{title}</Dialog.Title>
        {description && (
          <Dialog.Description size="2" mb="4">
            {description}
          </Dialog.Description>
        )}
        {children(() => setOpen(false))}
      </Dialog.Content>
    </Dialog.Root>
  );
}
