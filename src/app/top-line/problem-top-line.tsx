import { useLocation } from 'react-router-dom';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { daysBetween, inDays } from '#src/lib/dates/say-date.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { paths, STATIONS, type Station } from '#src/lib/paths.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { stationCup } from '#src/lib/station-cup.ts';
import { useStore } from '#src/lib/store/use-store.ts';
import { useDigitKeys } from '../keys/use-digit-keys.ts';
import { ConnectionWords } from './connection-words.tsx';
import { HereWords } from './here-words.tsx';
import { stationOf } from './station-of.ts';
import { TopLine } from './top-line.tsx';

const WORDS: Readonly<Record<Station, string>> = {
  trials: 'Trials',
  model: 'Model',
  report: 'Report',
  leaks: 'Leak check',
  editions: 'Editions',
};

/** The top line of a problem: its stations, the next fight, and who is here. */
export function ProblemTopLine() {
  const { address, team, problem, nextFight } = useProblem();
  const evidence = useEvidence();
  const said = useStore(stationCup);
  const here = stationOf(useLocation().pathname);
  const season = paths.season(team.slug);
  useDigitKeys(
    STATIONS.map((station) => paths.station(address, station)),
    season,
  );
  return (
    <TopLine
      home={season}
      small={team.name}
      name={problem.title}
      label="Stations of this problem"
      stations={STATIONS.map((station) => ({
        to: paths.station(address, station),
        words: WORDS[station],
        isHere: station === here,
        cup: station === here ? (said ?? usualCup(station, evidence)) : null,
      }))}
      others={[
        { to: season, words: 'Season' },
        { to: paths.settings(address), words: 'Settings of this problem' },
        { to: paths.account(), words: 'Your account' },
      ]}
      aside={
        <>
          {nextFight && (
            <>
              <b className="text-ink">{nextFight.name}</b>{' '}
              {inDays(daysBetween(new Date(), new Date(nextFight.at)))}
              <br />
            </>
          )}
          <ConnectionWords>
            <HereWords />
          </ConnectionWords>
        </>
      }
    />
  );
}

/** null: the screen itself says it. */
function usualCup(station: Station, evidence: Evidence): string | null {
  if (station === 'trials')
    return countOf(evidence.trials.filter(({ withdrawn }) => !withdrawn).length, 'trial');
  if (station === 'report') return 'draft';
  if (station === 'leaks' || station === 'editions') return null;
  const newest = Math.max(0, ...evidence.models.map(({ n }) => n));
  return newest === 0 ? 'no model yet' : `model ${newest}`;
}
