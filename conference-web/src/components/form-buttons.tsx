import { Button, Flex } from '@radix-ui/themes';

/** The end of a form in a dialog. */
export function FormButtons({ word, isBusy, onCancel }: { word: string; isBusy: boolean; onCancel: () => void }) {
  return (
    <Flex gap="3" justify="end" wrap="wrap" mt="2">
      <Button type="button" variant="soft" color="gray" onClick={onCancel}>
        Cancel
      </Button>
      <Button type="submit" loading={isBusy}>
        {word}
      </Button>
    </Flex>
  );
}
