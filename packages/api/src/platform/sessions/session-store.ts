import { createHash } from 'node:crypto';
import connectSessionSequelize from 'connect-session-sequelize';
import session, { type SessionData } from 'express-session';
import { DataTypes, QueryTypes, Sequelize } from 'sequelize';
import type { DatabaseConfig } from '../config/config.js';
import { v7 } from '../database/ids.js';

declare module 'express-session' {
  /** Only ids live in a session: what the person may do is read afresh at each request. */
  interface SessionData {
    personId?: string;
    /** When the row was last touched, milliseconds. */
    seenAt?: number;
  }
}

const IDLE_MS = 14 * 24 * 3_600_000;
export const LONGEST_MS = 30 * 24 * 3_600_000;
const TOUCH_MS = 60_000;

const SequelizeStore: ReturnType<typeof connectSessionSequelize> = connectSessionSequelize(session.Store);
type Done = (error?: unknown) => void;
/** Runs one query and answers its rows. */
export type LookUp = (sql: string, values: unknown[]) => Promise<{ data: string }[]>;
export type Visitor = { personId: string; userAgent: string; address: string };
export type SessionListing = {
  id: string;
  sid: string;
  userAgent: string;
  address: string;
  createdAt: Date;
  lastSeenAt: Date;
};

/**
 * The library's store with what it lacks: expired rows do not sign in, `set` never brings back a session that was ended
 * while its request was in flight, a read is one look-up, and a row is touched at most once a minute.
 */
export class SessionStore extends SequelizeStore {
  constructor(
    private readonly sequelize: Sequelize,
    private readonly look: LookUp,
    private readonly clock: () => Date,
  ) {
    super({ db: sequelize, table: 'session', checkExpirationInterval: 15 * 60_000, expiration: IDLE_MS });
  }

  /** Read at every request, so it goes past Sequelize, which costs more than the look-up itself. */
  override get = (sid: string, done: (error: unknown, session?: SessionData | null) => void): void => {
    this.look('select data from session where sid = ? and expires > ? and created_at > ?', [
      hashedSid(sid),
      ...this.alive(),
    ])
      .then(([row]) => done(null, row ? (JSON.parse(row.data) as SessionData) : null))
      .catch(done);
  };

  /** Updates only. A session begins with `begin`, never here. */
  override set = (sid: string, data: SessionData, done: Done = () => undefined): void => {
    this.run('update session set data = ? where sid = ?', [JSON.stringify(data), hashedSid(sid)], done);
  };

  override touch = (sid: string, data: SessionData, done: Done = () => undefined): void => {
    const now = this.clock();
    if (now.getTime() - (data.seenAt ?? 0) < TOUCH_MS) {
      done();
      return;
    }
    const kept = JSON.stringify({ ...data, seenAt: now.getTime() });
    const values = [kept, now, new Date(now.getTime() + IDLE_MS), hashedSid(sid)];
    this.run('update session set data = ?, last_seen_at = ?, expires = ? where sid = ?', values, done);
  };

  override destroy = (sid: string, done: Done = () => undefined): void => {
    this.run('delete from session where sid = ?', [hashedSid(sid)], done);
  };

  /** Writes the row of a browser that has just signed in. */
  async begin(sid: string, data: SessionData, visitor: Visitor): Promise<void> {
    const now = this.clock();
    // Set on the session itself: the request saves it once more when it ends.
    data.seenAt = now.getTime();
    await this.sequelize.query(
      `insert into session (sid, public_id, person_id, data, expires, created_at, last_seen_at, user_agent, address)
       values (?, ?, ?, ?, ?, ?, ?, ?, ?)`,
      {
        replacements: [
          hashedSid(sid),
          v7(now),
          visitor.personId,
          JSON.stringify(data),
          new Date(now.getTime() + IDLE_MS),
          now,
          now,
          visitor.userAgent.slice(0, 300),
          visitor.address.slice(0, 45),
        ],
      },
    );
  }

  /** A person's live sessions, the last seen first. */
  async listOf(personId: string): Promise<SessionListing[]> {
    return this.sequelize.query<SessionListing>(
      `select public_id as id, sid, user_agent as userAgent, address, created_at as createdAt, last_seen_at as lastSeenAt
       from session where person_id = ? and expires > ? and created_at > ? order by last_seen_at desc, id desc`,
      { replacements: [personId, ...this.alive()], type: QueryTypes.SELECT },
    );
  }

  /** Ends one of a person's sessions. Answers false when it is not theirs or is over already. */
  async endOne(personId: string, publicId: string): Promise<boolean> {
    const ended = await this.sequelize.query('delete from session where person_id = ? and public_id = ?', {
      replacements: [personId, publicId],
      type: QueryTypes.BULKDELETE,
    });
    return ended > 0;
  }

  /** Whether a stored row is the one of this session id. */
  isSame(sid: string, storedSid: string): boolean {
    return hashedSid(sid) === storedSid;
  }

  /** What a live row's `expires` and `created_at` lie after. */
  private alive(): [expiresAfter: Date, createdAfter: Date] {
    const now = this.clock();
    return [now, new Date(now.getTime() - LONGEST_MS)];
  }

  private run(sql: string, replacements: unknown[], done: Done): void {
    this.sequelize.query(sql, { replacements }).then(() => done(), done);
  }
}

/** How a session id stands in the table: a copy of the table signs nobody in. */
export function hashedSid(sid: string): string {
  return createHash('sha256').update(sid).digest('hex');
}

/** Sequelize serves the session table alone. */
export function createSessionDatabase(database: DatabaseConfig): Sequelize {
  const sequelize = new Sequelize(database.name, database.user, database.password, {
    host: database.host,
    port: database.port,
    dialect: 'mysql',
    logging: false,
    timezone: '+00:00',
    pool: { max: Math.max(2, Math.floor(database.pool / 2)), min: 1, idle: 60_000 },
  });
  sequelize.define(
    'session',
    {
      sid: { type: DataTypes.CHAR(64), primaryKey: true },
      expires: DataTypes.DATE(3),
      data: DataTypes.TEXT,
    },
    { tableName: 'session', timestamps: false },
  );
  return sequelize;
}
