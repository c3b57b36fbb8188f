import { Button, Flex } from '@radix-ui/themes';

interface ShowMoreProps {
  query: { hasNextPage: boolean; isFetchingNextPage: boolean; fetchNextPage: () => unknown; isFetchNextPageError: boolean };
}

/** The next page of a list, put below what is there. */
export function ShowMore({ query }: ShowMoreProps) {
  if (!query.hasNextPage) return null;
  return (
    <Flex mt="4" gap="3" align="center">
      <Button variant="soft" loading={query.isFetchingNextPage} onClick={() => void query.fetchNextPage()}>
        Show more
      </Button>
      {query.isFetchNextPageError && <span role="alert">The rest could not be fetched. Try again.</span>}
    </Flex>
  );
}
