import pg from "pg";
import { Sequelize, type Options } from "sequelize";
import { associateBlock, defineBlock } from "./block";
import { associateBlockDraft, defineBlockDraft } from "./block-draft";
import { associateBlockVersion, defineBlockVersion } from "./block-version";
import { associateBolt, defineBolt } from "./bolt";
import { associateCashMove, defineCashMove } from "./cash-move";
import { associateChange, defineChange } from "./change";
import { associateClaim, defineClaim } from "./claim";
import { associateColourway, defineColourway } from "./colourway";
import { associateColourwayLength, defineColourwayLength } from "./colourway-length";
import { associateCut, defineCut } from "./cut";
import { associateException, defineException } from "./exception";
import { associateFabric, defineFabric } from "./fabric";
import { associateFlaw, defineFlaw } from "./flaw";
import { associateInvitation, defineInvitation } from "./invitation";
import { associateKitDesign, defineKitDesign } from "./kit-design";
import { associateKitVersion, defineKitVersion } from "./kit-version";
import { associateMove, defineMove } from "./move";
import { defineNotion } from "./notion";
import { defineOutboxMessage } from "./outbox-message";
import { associatePackedNotion, definePackedNotion } from "./packed-notion";
import { associatePerson, definePerson } from "./person";
import { associatePiece, definePiece } from "./piece";
import { definePlan } from "./plan";
import { associatePlanningJob, definePlanningJob } from "./planning-job";
import { associatePrintJob, definePrintJob } from "./print-job";
import { associateQuilt, defineQuilt } from "./quilt";
import { associateQuiltVersion, defineQuiltVersion } from "./quilt-version";
import { associateRequest, defineRequest } from "./request";
import { associateReservation, defineReservation } from "./reservation";
import { defineRevision } from "./revision";
import { associateRun, defineRun } from "./run";
import { associateRunKit, defineRunKit } from "./run-kit";
import { associateRunLength, defineRunLength } from "./run-length";
import { associateSale, defineSale } from "./sale";
import { associateSaleLine, defineSaleLine } from "./sale-line";
import { associateSession, defineSession } from "./session";
import { defineShop } from "./shop";
import { defineSignInAttempt } from "./sign-in-attempt";
import { defineSupplier } from "./supplier";
import { defineTaxRate } from "./tax-rate";
import { associateTender, defineTender } from "./tender";
import { defineTill } from "./till";
import { associateTillSession, defineTillSession } from "./till-session";

/** A bigint fits a safe integer here (sums of lengths, ids), and comes as a number rather than as text. */
pg.types.setTypeParser(pg.types.builtins.INT8, Number);

const DEFINITIONS = {
  Block: defineBlock,
  BlockDraft: defineBlockDraft,
  BlockVersion: defineBlockVersion,
  Bolt: defineBolt,
  CashMove: defineCashMove,
  Change: defineChange,
  Claim: defineClaim,
  Colourway: defineColourway,
  ColourwayLength: defineColourwayLength,
  Cut: defineCut,
  Exception: defineException,
  Fabric: defineFabric,
  Flaw: defineFlaw,
  Invitation: defineInvitation,
  KitDesign: defineKitDesign,
  KitVersion: defineKitVersion,
  Move: defineMove,
  Notion: defineNotion,
  OutboxMessage: defineOutboxMessage,
  PackedNotion: definePackedNotion,
  Person: definePerson,
  Piece: definePiece,
  Plan: definePlan,
  PlanningJob: definePlanningJob,
  PrintJob: definePrintJob,
  Quilt: defineQuilt,
  QuiltVersion: defineQuiltVersion,
  Request: defineRequest,
  Reservation: defineReservation,
  Revision: defineRevision,
  Run: defineRun,
  RunKit: defineRunKit,
  RunLength: defineRunLength,
  Sale: defineSale,
  SaleLine: defineSaleLine,
  Session: defineSession,
  Shop: defineShop,
  SignInAttempt: defineSignInAttempt,
  Supplier: defineSupplier,
  TaxRate: defineTaxRate,
  Tender: defineTender,
  Till: defineTill,
  TillSession: defineTillSession,
} as const;

const ASSOCIATIONS: readonly ((models: Models) => void)[] = [
  associateBlock,
  associateBlockDraft,
  associateBlockVersion,
  associateBolt,
  associateCashMove,
  associateChange,
  associateClaim,
  associateColourway,
  associateColourwayLength,
  associateCut,
  associateException,
  associateFabric,
  associateFlaw,
  associateInvitation,
  associateKitDesign,
  associateKitVersion,
  associateMove,
  associatePackedNotion,
  associatePerson,
  associatePiece,
  associatePlanningJob,
  associatePrintJob,
  associateQuilt,
  associateQuiltVersion,
  associateRequest,
  associateReservation,
  associateRun,
  associateRunKit,
  associateRunLength,
  associateSale,
  associateSaleLine,
  associateSession,
  associateTender,
  associateTillSession,
];

export type Models = { [Name in keyof typeof DEFINITIONS]: ReturnType<(typeof DEFINITIONS)[Name]> };
export type Database = Models & { readonly sequelize: Sequelize };

const DEFAULT_POOL = 10;
const ACQUIRE_MS = 15_000;

/** One per process, whichever copy of this module asks: pages and routes get separate copies. */
const shared = globalThis as typeof globalThis & { ellwandDatabase?: Database };

/** The process's database: `DATABASE_URL`, with a pool of `DATABASE_POOL` connections (10). */
export function db(): Database {
  shared.ellwandDatabase ??= makeDb(urlOfProcess(), { pool: Number(process.env.DATABASE_POOL) || DEFAULT_POOL });
  return shared.ellwandDatabase;
}

/** Makes models of their own on another database; tests and scripts hand it to `useDb`. */
export function makeDb(url: string, { pool = DEFAULT_POOL, acquireMs = ACQUIRE_MS }: { pool?: number; acquireMs?: number } = {}): Database {
  const options: Options & { keepDefaultTimezone: boolean } = {
    dialect: "postgres",
    dialectModule: pg,
    logging: false,
    // No SET on connecting: behind a pooler in transaction mode a session's settings are somebody else's the next moment.
    keepDefaultTimezone: true,
    dialectOptions: { clientMinMessages: "ignore" },
    pool: { max: pool, min: 0, acquire: acquireMs, idle: 10_000 },
  };
  const sequelize = new Sequelize(url, options);
  const models = Object.fromEntries(Object.entries(DEFINITIONS).map(([name, define]) => [name, define(sequelize)])) as Models;
  for (const associate of ASSOCIATIONS) associate(models);
  return Object.assign(models, { sequelize });
}

/** Makes `db()` answer with this database from now on. The one before it stays open: close it if it was yours. */
export function useDb(database: Database): void {
  shared.ellwandDatabase = database;
}

/** Closes the process's pool; the next `db()` opens a new one. */
export async function closeDb(): Promise<void> {
  const open = shared.ellwandDatabase;
  delete shared.ellwandDatabase;
  await open?.sequelize.close();
}

function urlOfProcess(): string {
  const url = process.env.DATABASE_URL;
  if (!url) throw new Error("DATABASE_URL is not set: it names the PostgreSQL database, for example postgres://user@127.0.0.1:5432/ellwand");
  return url;
}
