'use client';

import { ActionForm } from '@/components/forms/action-form';
import { Input } from '@/components/ui/input';
import { Select } from '@/components/ui/select';
import { giveBackPaymentInput, paidByHandInput } from '@/lib/books/schema';
import type { FormAction } from '@/lib/core/form-state';
import { Row } from './row';

const METHODS = [{ value: 'cheque', label: 'a cheque' }, { value: 'cash', label: 'cash' }, { value: 'transfer', label: 'a bank transfer' }];

/** Gives some or all of one payment back. */
export function GiveBackPaymentForm({ action, paymentId, amount, submit }: { action: FormAction; paymentId: string; amount: string; submit: string }) {
  return (
    <ActionForm action={action} schema={giveBackPaymentInput} submit={submit} tone="danger" whenDone="clear">
      <input type="hidden" name="paymentId" value={paymentId} />
      <Input name="amount" label="Amount" inputMode="decimal" defaultValue={amount} width="short" required />
      <Input name="reason" label="Why, for the letter and the books" required />
    </ActionForm>
  );
}

/** Says how a refund went that the card service would not make. */
export function PaidByHandForm({ action, refundId }: { action: FormAction; refundId: string }) {
  return (
    <ActionForm action={action} schema={paidByHandInput} submit="It is paid out: book it" tone="plain">
      <input type="hidden" name="refundId" value={refundId} />
      <Row>
        <Select name="method" label="It went as" choices={METHODS} width="half" />
      </Row>
    </ActionForm>
  );
}
