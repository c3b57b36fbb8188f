import { useSearchParams } from 'react-router-dom';
import { SelectField } from '@/components/field';
import type { Schemas } from '@/lib/api/types';
import { formatDateTime } from '@/lib/dates';
import { Differences } from './differences';
import styles from './history.module.css';

type Version = Schemas['CaseVersionDto'];

const chosen = (address: URLSearchParams, name: string, versions: Version[], otherwise: number | undefined) => {
  const asked = Number(address.get(name));
  return versions.some(({ version }) => version === asked) ? asked : otherwise;
};

/** Any two versions; which two stands in the address, so that they can be pointed out to somebody. */
export function CompareVersions({ caseId, versions }: { caseId: string; versions: Version[] }) {
  const [address, setAddress] = useSearchParams();
  if (versions.length < 2) return <p className="label-text">There is one version only.</p>;
  const from = chosen(address, 'from', versions, versions.at(-1)?.version)!;
  const to = chosen(address, 'to', versions, versions[0]?.version)!;
  const choose = (name: string, value: string) =>
    setAddress((now) => {
      now.set(name, value);
      return now;
    }, { replace: true, flushSync: true });
  const words = Object.fromEntries(versions.map(({ version, at, author }) => [version, `${version}: ${formatDateTime(at)}, ${author.name}`]));
  const [older, newer] = from <= to ? [from, to] : [to, from];
  return (
    <>
      <div className={styles.choice}>
        <SelectField label="From version" words={words} value={from} onChange={(event) => choose('from', event.target.value)} />
        <SelectField label="To version" words={words} value={to} onChange={(event) => choose('to', event.target.value)} />
      </div>
      {address.has('from') || address.has('to') ? (
        older === newer ? (
          <p className="label-text">Choose two different versions.</p>
        ) : (
          <Differences caseId={caseId} since={older} version={newer} />
        )
      ) : (
        <p className="label-text">Choose two versions to see what changed from one to the other.</p>
      )}
    </>
  );
}
