import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { AttendanceState } from '@kerfside/calc/vocabulary/meetings.js';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';
import type { Meeting } from './get-meeting';
import { takeMeeting } from './take-meeting';

export function useStartMeeting(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(api.POST('/api/meetings/{id}/start', { params: { path: { id } } })),
    onSuccess: (meeting) => takeMeeting(client, meeting),
  });
}

export function useCloseMeeting(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(api.POST('/api/meetings/{id}/close', { params: { path: { id } } })),
    onSuccess: (meeting) => {
      // cases left undecided may have gone back to open
      void client.invalidateQueries({ queryKey: keys.cases.everything });
      return takeMeeting(client, meeting);
    },
  });
}

/** Shown at once, since the chair ticks people off as they come in; put back where it is refused. */
export function useSetAttendance(id: string) {
  const client = useQueryClient();
  const key = keys.meetings.one(id);
  return useMutation({
    mutationFn: ({ personId, state }: { personId: string; state: AttendanceState | null }) =>
      call(api.PUT('/api/meetings/{id}/attendance/{personId}', { params: { path: { id, personId } }, body: { state } })),
    onMutate: async ({ personId, state }) => {
      await client.cancelQueries({ queryKey: key });
      client.setQueryData<Meeting>(key, (meeting) => meeting && { ...meeting, attendance: withState(meeting, personId, state) });
    },
    mutationKey: ['attendance', id],
    // the answer to an earlier tick would undo a later one on screen
    onSettled: () => (client.isMutating({ mutationKey: ['attendance', id] }) === 1 ? client.invalidateQueries({ queryKey: key, exact: true }) : undefined),
  });
}

const withState = (meeting: Meeting, personId: string, state: AttendanceState | null) =>
  meeting.attendance.map((row) => (row.person.id === personId ? { ...row, state } : row));

export function useDeferItem(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ itemId, reason }: { itemId: string; caseId: string; reason: string }) =>
      call(api.POST('/api/meetings/{id}/items/{itemId}/defer', { params: { path: { id, itemId } }, body: { reason } })),
    onSuccess: (meeting, { caseId }) => {
      void client.invalidateQueries({ queryKey: keys.cases.all(caseId) });
      return takeMeeting(client, meeting);
    },
  });
}
