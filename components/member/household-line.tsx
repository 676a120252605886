import { When } from '@/components/ui/when';
import type { ClubTime } from '@/lib/core/time';
import type { Station } from '@/lib/dues/rules/line';
import styles from './household-line.module.css';

/** A household's line: dated facts as stations on the rail, what is to come on sleepers without one. */
export function HouseholdLine({ stations, club }: { stations: readonly Station[]; club: ClubTime }) {
  return (
    <ol className={styles.line}>
      {stations.map((station) => (
        <li key={station.id} className={`${styles.station} ${styles[station.tone]} ${station.isLaid ? '' : styles.unlaid}`}>
          <span className={styles.box} aria-hidden="true" />
          <span className={styles.words}>
            <strong className={`block font-heading text-lg leading-tight font-bold ${styles.name}`}>{station.name}</strong>
            <span className="block font-mono text-base leading-snug"><When on={station.on} style="short" club={club} /></span>
            {station.note === '' ? null : <span className="block leading-snug text-ink-soft">{station.note}</span>}
          </span>
        </li>
      ))}
    </ol>
  );
}
