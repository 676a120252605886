'use server';
import { askForCode, endAllSignIns, endSignIn, signInWithCode, signInWithLink, signInWithPassword } from '@/lib/people/commands/sign-in';
import { askForCodeInput, nothingInput, signInCodeInput, signInLinkInput, signInPasswordInput } from '@/lib/people/schema';
import { action } from '@/lib/web/action';
import { askedThen, leaveSession, startSessionThen } from './session';

export const askForCodeAction = action({
  requires: 'anyone',
  input: askForCodeInput,
  run: askForCode,
  after: askedThen,
});

export const signInWithCodeAction = action({ requires: 'anyone', input: signInCodeInput, run: signInWithCode, after: startSessionThen });

export const signInWithLinkAction = action({ requires: 'anyone', input: signInLinkInput, run: signInWithLink, after: startSessionThen });

export const signInWithPasswordAction = action({ requires: 'anyone', input: signInPasswordInput, run: signInWithPassword, after: startSessionThen });

export const signOutAction = action({ requires: 'account', input: nothingInput, run: endSignIn, after: leaveSession });

export const signOutEverywhereAction = action({ requires: 'account', input: nothingInput, run: endAllSignIns, after: leaveSession });
