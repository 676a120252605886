import type { CSSProperties, ReactNode } from 'react';
import { BufferStop, Shed } from '@/components/drawing/line-side';
import { Train, trainLength } from '@/components/drawing/train';

type RailRuleProps =
  | { state?: 'plain'; /** Where a train's middle stands, 0 to 1; it runs there when this changes. */ trainAt?: number; coaches?: number }
  /** Rails laid over the share done, 0 to 1; `label` says what is waited for. */
  | { state: 'waiting'; share: number; label: string }
  /** Sleepers not yet railed: a list with nothing in it. */
  | { state: 'empty' }
  /** A buffer stop: something did not work; the way back stands below it. */
  | { state: 'failed' }
  /** The train in its shed: a finished day. */
  | { state: 'done' };

const within = (share: number) => Math.min(1, Math.max(0, share));
const vars = (values: Record<`--${string}`, string | number>): CSSProperties => values;

/** The line under the bill, seen from the side, once a page. What it means is always said in words as well. */
export function RailRule(props: RailRuleProps) {
  switch (props.state) {
    case 'waiting':
      return <Waiting share={within(props.share)} label={props.label} />;
    case 'empty':
      return <div className="rail rail-unlaid mt-6" aria-hidden="true" />;
    case 'failed':
      return (
        <div className="pt-18" aria-hidden="true">
          <div className="rail" style={vars({ '--laid': '70%' })}>
            <OnTheRail at={0.7} lead={1} length={77}>
              <BufferStop />
            </OnTheRail>
          </div>
        </div>
      );
    case 'done':
      return (
        <div className="pt-17" aria-hidden="true">
          <div className="rail">
            <span className="absolute right-7 bottom-[13px]">
              <Train height={26} />
            </span>
            <span className="absolute right-0 bottom-[13px]">
              <Shed />
            </span>
          </div>
        </div>
      );
    default:
      if (props.trainAt === undefined) return <div className="rail mt-6" aria-hidden="true" />;
      return (
        <div className="pt-12" aria-hidden="true">
          <div className="rail">
            <OnTheRail at={within(props.trainAt)} lead={0.5} length={trainLength(props.coaches ?? 1, 34)}>
              <Train coaches={props.coaches ?? 1} />
            </OnTheRail>
          </div>
        </div>
      );
  }
}

function Waiting({ share, label }: { share: number; label: string }) {
  const percent = Math.round(share * 100);
  return (
    <div role="progressbar" aria-label={label} aria-valuenow={percent} aria-valuemin={0} aria-valuemax={100} className="pt-10">
      <div className="rail" style={vars({ '--laid': `${percent}%` })}>
        <OnTheRail at={share} lead={1} length={trainLength(0, 34)}>
          <Train coaches={0} />
        </OnTheRail>
      </div>
    </div>
  );
}

/** `lead`: which point of the train stands at `at`, 0.5 its middle, 1 its front. */
function OnTheRail({ at, lead, length, children }: { at: number; lead: number; length: number; children: ReactNode }) {
  return (
    <span className="rail-train" style={vars({ '--at': at, '--lead': lead, '--train-length': `${length}px` })}>
      {children}
    </span>
  );
}
