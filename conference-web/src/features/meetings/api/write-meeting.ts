import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';
import type { Meeting } from './get-meeting';
import { takeMeeting } from './take-meeting';

function useMeetingMutation<T>(mutationFn: (input: T) => Promise<Meeting>) {
  const client = useQueryClient();
  return useMutation({ mutationFn, onSuccess: (meeting) => takeMeeting(client, meeting) });
}

/** A meeting outside the slot. */
export const useCreateMeeting = () =>
  useMeetingMutation(({ conferenceId, ...body }: Schemas['CreateMeetingDto'] & { conferenceId: string }) =>
    call(api.POST('/api/conferences/{conferenceId}/meetings', { params: { path: { conferenceId } }, body })),
  );

export function useMoveMeeting(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['UpdateMeetingDto']) => call(api.PATCH('/api/meetings/{id}', { params: { path: { id } }, body })),
    onSuccess: (meeting) => takeMeeting(client, meeting),
    // a stale version is refused: what is there now must be fetched for the second try
    onError: () => client.invalidateQueries({ queryKey: keys.meetings.one(id) }),
  });
}

export const useCancelMeeting = (id: string) =>
  useMeetingMutation((reason: string) => call(api.POST('/api/meetings/{id}/cancel', { params: { path: { id } }, body: { reason } })));
