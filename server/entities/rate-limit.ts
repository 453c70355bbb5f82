import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** Counters of the rate limiter, shared by every process; the limiter library reads and writes the rows. */
@Entity('rate_limit')
export class RateLimit {
  @PrimaryColumn({ type: 'varchar', length: 255 })
  key!: string;

  @Column({ type: 'int', default: 0 })
  points!: number;

  @Index('rate_limit_expire_idx')
  @Column({ type: 'bigint', nullable: true })
  expire!: string | null;
}
