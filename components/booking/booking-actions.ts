import type { FormAction } from '@/lib/core/form-state';

/** What can be done on a booking's page; the page passes the actions in. */
export type BookingActions = { giveBack: FormAction; change: FormAction; confirmEmail: FormAction; makeFeed: FormAction; revokeFeed: FormAction };
