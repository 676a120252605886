'use server';
import { redirect } from 'next/navigation';
import { startDuesPayment } from '@/lib/dues/pay';
import { payDuesInput } from '@/lib/dues/schema';
import { action } from '@/lib/web/action';

export const payDuesAction = action({ requires: 'member', input: payDuesInput, run: startDuesPayment, after: (payAt) => redirect(payAt) });
