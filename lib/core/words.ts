/** The product's fixed lists, one home each: tables check them, schemas read them, screens show them. */

/** Officers' roles. */
export const ROLES = ['administrator', 'coordinator', 'secretary', 'treasurer'] as const;
export type Role = (typeof ROLES)[number];

/** What drives a garden's trains. */
export const POWERS = ['live-steam', 'battery', 'track', 'overhead', 'clockwork'] as const;
export type Power = (typeof POWERS)[number];

/** The bridge a plate shows. */
export const BRIDGES = ['none', 'trestle', 'viaduct', 'girder', 'truss', 'pier'] as const;
export type Bridge = (typeof BRIDGES)[number];

/** Water in a garden. */
export const WATERS = ['none', 'brook', 'pond', 'pool', 'lagoon'] as const;
export type Water = (typeof WATERS)[number];

/** Kinds of people by price. */
export const PERSON_KINDS = ['adult', 'child', 'babe'] as const;
export type PersonKind = (typeof PERSON_KINDS)[number];

/** Ways money comes in. */
export const METHODS = ['card', 'cheque', 'cash', 'transfer'] as const;
export type Method = (typeof METHODS)[number];

/** What a phone does at a gate. */
export const FACT_KINDS = ['admit', 'refuse', 'count-out', 'walk-up', 'undo'] as const;
export type FactKind = (typeof FACT_KINDS)[number];
