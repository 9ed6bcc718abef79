import type { Measurements } from '@/lib/schemas/measurements';
import { MeasurementChart } from './MeasurementChart';

/** Every measured quantity of a unit over its engine hours. */
export function UnitMeasurements({ measurements }: { measurements: Measurements }) {
  return (
    <section id="measurements" className="grid gap-4" aria-labelledby="measured">
      <h2 id="measured" className="text-2xl">
        Measured so far
      </h2>
      {measurements.items.length === 0 ? (
        <p className="text-ink-soft">
          Nothing yet. What is measured in the steps of a task is drawn here over engine hours, with its
          limits.
        </p>
      ) : (
        <div className="grid gap-6 lg:grid-cols-2">
          {measurements.items.map((series) => (
            <MeasurementChart key={series.spec} series={series} noun="No." />
          ))}
        </div>
      )}
    </section>
  );
}
