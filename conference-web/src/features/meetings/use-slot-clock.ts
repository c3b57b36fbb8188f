import { useEffect, useState } from 'react';
import type { Meeting } from './api/get-meeting';
import { chooseSlot, EMPTY_CLOCK, type SlotClock, startClock, stopClock } from './slot-clock';

const storageKey = (meetingId: string) => `kerfside:slot-clock:${meetingId}`;

function readClock(meetingId: string): SlotClock {
  try {
    return { ...EMPTY_CLOCK, ...(JSON.parse(localStorage.getItem(storageKey(meetingId)) ?? '{}') as Partial<SlotClock>) };
  } catch {
    return EMPTY_CLOCK;
  }
}

/** The time, told every second while it is looked at. */
export function useNow(isTicking: boolean): number {
  const [now, setNow] = useState(() => Date.now());
  useEffect(() => {
    if (!isTicking) return;
    const timer = setInterval(() => setNow(Date.now()), 1000);
    return () => clearInterval(timer);
  }, [isTicking]);
  return now;
}

/** The current case and the time that each has had, on this device only; a reload goes on where it was. */
export function useSlotClock(meeting: Meeting) {
  const { id, state, items } = meeting;
  const [clock, setClock] = useState(() => readClock(id));
  const isRunning = state === 'running';
  const put = (next: SlotClock) => {
    setClock(next);
    try {
      localStorage.setItem(storageKey(id), JSON.stringify(next));
    } catch {
      // without a store the times are lost at a reload, no more
    }
  };
  const chosen = items.find((item) => item.id === clock.currentId);
  return {
    clock,
    // until one is chosen, the first that is still to be talked about
    current: chosen ?? items.find((item) => item.state === 'listed') ?? items[0] ?? null,
    choose: (itemId: string) => put(chooseSlot(clock, itemId, Date.now(), isRunning)),
    stop: () => put(stopClock(clock, Date.now())),
    start: (itemId: string) => put(clock.currentId === itemId ? startClock(clock, Date.now()) : chooseSlot(clock, itemId, Date.now(), true)),
  };
}
