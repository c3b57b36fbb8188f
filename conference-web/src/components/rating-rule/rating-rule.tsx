import { BANDS, countEach, DOT, type Dot, GROUND, placeLanes, placeOf, SCALE, WIDTH } from './rule-geometry';
import styles from './rating-rule.module.css';

export interface RuleRound {
  number: number;
  n: number;
  median: number | null;
  low: number | null;
  high: number | null;
  values: number[];
}

interface RatingRuleProps {
  /** The option that was rated. */
  title: string;
  /** Those that may be seen; none while the own rating is not in. */
  rounds: RuleRound[];
  /** The own rating, marked below the rule. */
  mine?: number | null;
  /** Something below it bears the numerals: on a wide screen the rule leaves out its own. */
  isBare?: boolean;
}

const FOOT = 40;

/**
 * A ruler from 1 to 9 in three named bands. The ratings stand on it as dots, a lane for each round, the first in
 * outline and the second filled; the median is a tall tick, lowest to highest a bar. The same stands in a table for
 * those who do not see the drawing.
 */
export function RatingRule({ title, rounds, mine = null, isBare = false }: RatingRuleProps) {
  const shown = rounds.filter(({ n }) => n > 0);
  const { lanes, ruler } = placeLanes(shown);
  return (
    <figure className={styles.rule} data-bare={isBare || undefined} data-empty={shown.length === 0 || undefined}>
      <svg viewBox={`0 0 ${WIDTH} ${ruler + FOOT}`} aria-hidden="true" className={styles.drawing}>
        {lanes.map((lane) => (
          <Lane key={lane.round.number} {...lane} />
        ))}
        <Ruler y={ruler} />
        {mine !== null && <path className={styles.mine} d={`M${placeOf(mine)} ${ruler + 4}l4.5 7h-9z`} data-mine={mine} />}
      </svg>
      <div className="visually-hidden">
        <RuleTable title={title} rounds={shown} mine={mine} />
      </div>
    </figure>
  );
}

interface LaneProps {
  round: RuleRound;
  dots: Dot[];
  top: number;
  ground: number;
}

function Lane({ round, dots, top, ground }: LaneProps) {
  const { number, median, low, high } = round;
  return (
    <g data-round={number} className={number === 1 ? styles.first : styles.second}>
      <text x={1} y={ground - GROUND} className={styles.laneName}>
        {number}
      </text>
      {low !== null && high !== null && (
        <rect
          className={styles.spread}
          x={placeOf(low) - DOT}
          width={placeOf(high) - placeOf(low) + 2 * DOT}
          y={ground}
          height={4}
          data-low={low}
          data-high={high}
        />
      )}
      {/* behind the dots, so that it hides none of them */}
      {median !== null && <line className={styles.median} x1={placeOf(median)} x2={placeOf(median)} y1={top - 4} y2={ground + 10} data-median={median} />}
      {dots.map(({ rating, x, up }) => (
        <circle key={`${rating} ${up}`} cx={x} cy={ground - GROUND / 2 - DOT - up} r={DOT - 0.5} data-rating={rating} />
      ))}
    </g>
  );
}

function Ruler({ y }: { y: number }) {
  return (
    <g className={styles.ruler}>
      <line x1={placeOf(1) - 12} x2={placeOf(9) + 12} y1={y} y2={y} />
      {SCALE.map((rating) => (
        <g key={rating}>
          <line x1={placeOf(rating)} x2={placeOf(rating)} y1={y - 4} y2={y} />
          <text x={placeOf(rating)} y={y + 21} className={styles.numeral}>
            {rating}
          </text>
        </g>
      ))}
      {[3.5, 6.5].map((between) => (
        <line key={between} x1={placeOf(between)} x2={placeOf(between)} y1={y - 7} y2={y + FOOT} className={styles.boundary} />
      ))}
      {BANDS.map(({ word, from, to }) => (
        <text key={word} x={placeOf((from + to) / 2)} y={y + 35} className={styles.band}>
          {word}
        </text>
      ))}
    </g>
  );
}

function RuleTable({ title, rounds, mine }: Required<Omit<RatingRuleProps, 'isBare'>>) {
  if (rounds.length === 0)
    return (
      <p>
        {title}: a rule from 1 to 9, no ratings shown.{mine !== null && ` Your rating: ${mine}.`}
      </p>
    );
  return (
    <table>
      <caption>
        Ratings of {title}, 1 to 3 inappropriate, 4 to 6 uncertain, 7 to 9 appropriate.{mine !== null && ` Yours: ${mine}.`}
      </caption>
      <thead>
        <tr>
          {['Round', 'Ratings', 'Median', 'Lowest', 'Highest', ...SCALE.map((rating) => `Gave ${rating}`)].map((head) => (
            <th key={head} scope="col">
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rounds.map(({ number, n, median, low, high, values }) => (
          <tr key={number}>
            <th scope="row">{number}</th>
            <td>{n}</td>
            <td>{median}</td>
            <td>{low}</td>
            <td>{high}</td>
            {countEach(values).map((count, index) => (
              <td key={index}>{count}</td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
