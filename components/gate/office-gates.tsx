import { NipCard } from '@/components/drawing/nip';
import { Table } from '@/components/ui/table';
import type { FormAction } from '@/lib/core/form-state';
import type { OfficeGate, OfficeGates } from '@/lib/gate/views/office';
import { GatePassForm, RevokeGatePassForm } from './pass-forms';

type OfficeGateListProps = { view: OfficeGates; makePass: FormAction; revokePass: FormAction };

/** All gates of an open day on the staff copy: counts first, then each gate with its passes. */
export function OfficeGateList({ view, makePass, revokePass }: OfficeGateListProps) {
  return (
    <>
      <Table
        caption="Heads at each gate"
        rows={view.gates}
        rowKey={(gate) => gate.stopId}
        empty="No garden takes part in this open day yet. Add a stop first."
        columns={[
          { key: 'number', head: 'Stop', cell: (gate) => <span className="flex items-center gap-2"><NipCard stopNumber={gate.number} width={38} />{gate.number}</span> },
          { key: 'garden', head: 'Garden', names: 'row', cell: (gate) => <a className="link" href={`#gate-${gate.number}`}>{gate.garden}</a> },
          { key: 'expected', head: 'Expected', set: 'figures', cell: (gate) => gate.expected },
          { key: 'in', head: 'Let in', set: 'figures', cell: (gate) => gate.cameIn },
          { key: 'now', head: 'In now', set: 'figures', cell: (gate) => gate.now },
          { key: 'limit', head: 'Limit', set: 'figures', cell: (gate) => gate.headsLimit },
          { key: 'refusals', head: 'Turned away', set: 'figures', cell: (gate) => gate.refusals },
        ]}
      />
      {view.gates.map((gate) => <Gate key={gate.stopId} gate={gate} makePass={makePass} revokePass={revokePass} />)}
    </>
  );
}

function Gate({ gate, makePass, revokePass }: { gate: OfficeGate; makePass: FormAction; revokePass: FormAction }) {
  return (
    <section aria-labelledby={`gate-${gate.number}`} className="mt-8 border-t border-rule pt-4">
      <h2 id={`gate-${gate.number}`} tabIndex={-1}>{gate.number} {gate.garden}</h2>
      <div className="grid gap-6 pt-2 lg:grid-cols-[3fr_2fr]">
        <Table
          caption={`Gate passes of ${gate.garden}`}
          rows={gate.passes}
          rowKey={(pass) => pass.gatePassId}
          empty="Nobody has a pass for this gate yet. Make one for each helper."
          columns={[
            { key: 'helper', head: 'Helper', names: 'row', cell: (pass) => pass.helper },
            { key: 'made', head: 'Made', cell: (pass) => pass.madeText },
            { key: 'phones', head: 'Opened on', cell: (pass) => pass.phonesText },
            { key: 'seen', head: 'Last', cell: (pass) => pass.seenText },
            { key: 'revoke', head: 'Take back', cell: (pass) => (pass.isLive ? <RevokeGatePassForm action={revokePass} gatePassId={pass.gatePassId} helper={pass.helper} /> : null) },
          ]}
        />
        <GatePassForm action={makePass} stopId={gate.stopId} garden={gate.garden} />
      </div>
    </section>
  );
}
