import type pg from 'pg';
import { checkOwnCycle } from '#shared/core/cycles/own-cycle';
import { BUILT_IN_CYCLES, builtInCycle } from './cycles/built-in-cycles';

/**
 * Writes the built-in cycles with their totals into the table outside tenants. For the maintenance login; repeating it
 * changes nothing, and a cycle that was corrected in a newer version replaces the older one.
 */
export async function loadReferenceCycles(client: Pick<pg.ClientBase, 'query'>): Promise<void> {
  for (const [position, cycle] of BUILT_IN_CYCLES.entries()) {
    const { timeS, speedKmh } = builtInCycle(cycle.name);
    const [time, speed] = [Array.from(timeS), Array.from(speedKmh)];
    const { totals } = checkOwnCycle({ time, timeUnit: 's', speed, speedUnit: 'km/h' });
    const { durationS, distanceM, maximumSpeedKmh, meanSpeedKmh, maximumAccelerationMs2 } = totals;
    await client.query(
      `insert into reference_cycles (key, position, name, source, time_s, speed_kmh, totals)
       values ($1, $2, $3, $4, $5, $6, $7)
       on conflict (key) do update set position = excluded.position, name = excluded.name, source = excluded.source,
         time_s = excluded.time_s, speed_kmh = excluded.speed_kmh, totals = excluded.totals`,
      [
        cycle.name,
        position + 1,
        cycle.title,
        cycle.source,
        time,
        speed,
        // Regulations begin and end at rest and hold to what cars can do: there is nothing to be cautious about.
        { durationS, distanceM, maximumSpeedKmh, meanSpeedKmh, maximumAccelerationMs2, cautions: [] },
      ],
    );
  }
}
