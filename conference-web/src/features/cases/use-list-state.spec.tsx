import { act, renderHook } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import type { ReactNode } from 'react';
import { useListState } from './use-list-state';

function openAt(address: string) {
  const slot: { children?: ReactNode } = {};
  const router = createMemoryRouter([{ path: '/cases', Component: () => slot.children }], { initialEntries: [address] });
  const wrapper = ({ children }: { children: ReactNode }) => {
    slot.children = children;
    return <RouterProvider router={router} />;
  };
  const { result } = renderHook(() => useListState(), { wrapper });
  return { router, list: () => result.current };
}

it('keeps filters in the address, and going back undoes one', async () => {
  const { router, list } = openAt('/cases?stage=open');
  act(() => list().change({ joint: 'knee' }));
  expect(router.state.location.search).toBe('?stage=open&joint=knee');
  expect(list().filter).toMatchObject({ stage: ['open'], joint: 'knee' });
  await act(() => router.navigate(-1));
  expect(list().filter.joint).toBeUndefined();
});

it('turns a column round when it is sorted by a second time', () => {
  const { list } = openAt('/cases');
  act(() => list().sortBy('code'));
  expect(list().filter).toMatchObject({ sort: 'code', order: 'asc' });
  act(() => list().sortBy('code'));
  expect(list().filter).toMatchObject({ sort: 'code', order: 'desc' });
  act(() => list().sortBy('urgency'));
  expect(list().filter).toMatchObject({ sort: 'urgency', order: 'desc' });
});

it('clears the filters', () => {
  const { router, list } = openAt('/cases?mine=true&query=cup');
  act(() => list().clear());
  expect(router.state.location.search).toBe('');
});
