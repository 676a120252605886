'use client';

import { ActionForm } from '@/components/forms/action-form';
import { PrintButton } from '@/components/layout/print-button';
import { Input } from '@/components/ui/input';
import { Select } from '@/components/ui/select';
import type { FormAction } from '@/lib/core/form-state';
import { makeGatePassInput } from '@/lib/gate/schema';
import { passCardOf, type PassCard } from '@/lib/gate/views/pass-card';

type GatePassFormProps = { action: FormAction; gates: readonly { stopId: string; number: number; garden: string }[] };

/** Makes a pass for one gate. Its link and code are shown here once, to be printed or handed on, and nowhere again. */
export function GatePassForm({ action, gates }: GatePassFormProps) {
  return (
    <ActionForm
      action={action}
      schema={makeGatePassInput}
      values={{ devices: '2' }}
      submit="Make a gate pass"
      whenDone="clear"
      done={(state) => {
        const card = passCardOf(state);
        return card && <NewPass card={card} />;
      }}
    >
      <div className="grid gap-5 sm:grid-cols-3 print:hidden">
        <Select name="stopId" label="Gate" choices={gates.map(({ stopId, number, garden }) => ({ value: stopId, label: `${number} ${garden}` }))} />
        <Input name="helper" label="Helper, or which turn" autoComplete="off" required />
        <Input name="devices" label="On how many phones" inputMode="numeric" autoComplete="off" defaultValue="2" required />
      </div>
    </ActionForm>
  );
}

/** A pass just made: its code on white for a camera, its link for a message. */
function NewPass({ card }: { card: PassCard }) {
  return (
    <div className="mt-3 flex flex-wrap gap-5">
      <svg role="img" aria-label={`Code of the gate pass for ${card.helper}`} viewBox={`0 0 ${card.size} ${card.size}`} className="w-56 bg-sun-paper text-sun-ink" shapeRendering="crispEdges">
        <path d={card.path} fill="currentColor" />
      </svg>
      <div className="grid min-w-0 flex-[1_1_18rem] content-start gap-3">
        <p>
          For {card.helper} at {card.garden}. Open this link on the phone, or hold its camera before the code:
        </p>
        <p className="figures break-all select-all">{card.link}</p>
        <p>It is shown this once. Whoever has it can open this gate, so hand it to nobody else.</p>
        <PrintButton>Print the pass</PrintButton>
      </div>
    </div>
  );
}

/** Takes a pass back; its phones are refused at once. */
export function RevokeGatePassForm({ action, gatePassId, helper }: { action: FormAction; gatePassId: string; helper: string }) {
  return (
    <ActionForm action={action} submit={`Take back the pass of ${helper}`} tone="bare">
      <input type="hidden" name="gatePassId" value={gatePassId} />
    </ActionForm>
  );
}
