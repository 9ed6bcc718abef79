import { Notice } from '@/components/ui/Notice';
import type { Task } from '@/lib/schemas/task';

/** What is to be minded before work on any unit begins. It gives way to the engine maker's manual and local law. */
export function Cautions({ kind }: { kind: Task['kind'] }) {
  return (
    <Notice tone="warn" title="Before you begin" still>
      <ul className="grid list-disc gap-1 pl-5">
        <li>Petrol vapour is heavier than air and gathers in the hull. Open it, air it, keep sparks away.</li>
        <li>
          Never run the engine in a closed room: exhaust holds carbon monoxide, which one neither sees nor
          smells.
        </li>
        <li>Take the lanyard off and make sure that nobody can start it before you reach into the pump.</li>
        {kind === 'rebuild' ? (
          <li>Spray no solvent near heat or an arc, and wear eye protection when blowing out passages.</li>
        ) : null}
        <li>
          The engine maker&rsquo;s manual, local law and licensed practice come before anything shown here.
        </li>
      </ul>
    </Notice>
  );
}
