import { SECTION_WORDS } from '@kerfside/calc/vocabulary/case.js';
import { useQuery } from '@tanstack/react-query';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { differencesQuery } from '../../api/get-differences';
import styles from './history.module.css';

interface DifferencesProps {
  caseId: string;
  since: number;
  version: number;
}

/** What changed from one version to another, field by field in words. */
export function Differences({ caseId, since, version }: DifferencesProps) {
  const query = useQuery(differencesQuery(caseId, version, since));
  return (
    <Loaded query={query} skeleton={<TextSkeleton lines={3} />} what="version">
      {({ differences }) =>
        differences.length === 0 ? (
          <p className="label-text">The two say the same.</p>
        ) : (
          <table className={styles.table} aria-label={`From version ${since} to version ${version}`}>
            <thead>
              <tr>
                <th scope="col">Field</th>
                <th scope="col">From</th>
                <th scope="col">To</th>
              </tr>
            </thead>
            <tbody>
              {differences.map(({ section, path, label, from, to }) => (
                <tr key={`${section} ${path} ${label}`}>
                  <th scope="row">
                    <span>{SECTION_WORDS[section]}</span>
                    {label}
                  </th>
                  <td data-label="From">{from === null ? <em>nothing</em> : <del>{from}</del>}</td>
                  <td data-label="To">{to === null ? <em>nothing</em> : <ins>{to}</ins>}</td>
                </tr>
              ))}
            </tbody>
          </table>
        )
      }
    </Loaded>
  );
}
