import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** A browser's session. The cookie carries the id under a signature, so that a copy of this table opens nothing. */
@Entity('web_session')
export class WebSession {
  @PrimaryColumn({ type: 'text' })
  sid!: string;

  @Column({ type: 'json' })
  sess!: Record<string, unknown>;

  @Index('web_session_expire_idx')
  @Column({ type: 'timestamp', precision: 6 })
  expire!: Date;
}
