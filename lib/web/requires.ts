import type { AccountActor, Actor, BookingActor, HolderActor, MemberActor, Stranger } from '@/lib/infra/context';
import type { Capability } from '@/lib/people/rules/capabilities';

/**
 * Who may: `anyone`; a `browser` that holds places or is about to; the holder of a `booking`'s link or its household;
 * a signed-in `account`; a `member` of a household; an `officer` of any role; or an officer with a capability.
 */
export type Requires = 'anyone' | 'browser' | 'booking' | 'account' | 'member' | 'officer' | Capability;

/** An account that was found to hold a capability. A command that takes one cannot be wired to `anyone`. */
export type OfficerActor = AccountActor;

/** The actor a command is given for what its action requires. */
export type ActorFor<R extends Requires> =
  R extends 'anyone' ? Stranger | AccountActor
  : R extends 'browser' ? HolderActor
  : R extends 'booking' ? BookingActor
  : R extends 'account' ? AccountActor
  : R extends 'member' ? MemberActor
  : R extends 'officer' | Capability ? OfficerActor
  : Actor;
