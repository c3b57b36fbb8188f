import type { QuorumRule } from '../vocabulary/conference.js';
import { type Attendee, quorum } from './quorum.js';

// Common practice, no source: a conference sets its own rule; the examples are our own.
const rule: QuorumRule = {
  raters: 3,
  disciplines: [
    { discipline: 'revision-surgery', atLeast: 2 },
    { discipline: 'infection-microbiology', atLeast: 1, infectionOnly: true },
  ],
};
const surgeon: Attendee = { discipline: 'revision-surgery', role: 'surgeon', state: 'present' };
const chair: Attendee = { discipline: 'revision-surgery', role: 'chair', state: 'present' };
const radiology: Attendee = { discipline: 'musculoskeletal-radiology', role: 'panellist', state: 'remote' };
const microbiology: Attendee = { discipline: 'infection-microbiology', role: 'panellist', state: 'present' };

describe('quorum', () => {
  it('is met by head count and disciplines, those at a distance included', () => {
    expect(quorum(rule, [surgeon, chair, radiology], false)).toEqual({ met: true, missing: [] });
  });

  it('asks for microbiology where the case is infected', () => {
    expect(quorum(rule, [surgeon, chair, radiology], true)).toEqual({ met: false, missing: ['1 more of infection and microbiology'] });
    expect(quorum(rule, [surgeon, chair, microbiology], true).met).toBe(true);
  });

  it('does not count apologies, observers and coordinators', () => {
    const attendees: Attendee[] = [chair, { ...surgeon, state: 'apologies' }, { ...surgeon, role: 'observer' }, { ...radiology, role: 'coordinator' }];
    const { met, missing } = quorum(rule, attendees, false);
    expect(met).toBe(false);
    expect(missing).toEqual(['2 more members who rate', '1 more of revision surgery']);
  });

  it('is not met by nobody', () => {
    expect(quorum(rule, [], true).missing).toHaveLength(3);
  });
});
