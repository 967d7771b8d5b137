import { Injectable } from '@nestjs/common';
import { hash, verify } from '@node-rs/argon2';

// the package's enum is ambient, which isolated modules cannot read
const ARGON2ID = 2;

/** argon2id with OWASP's second recommended setting (19 MiB, 2 passes, 1 lane). */
@Injectable()
export class PasswordService {
  hash(password: string): Promise<string> {
    return hash(password, { algorithm: ARGON2ID, memoryCost: 19_456, timeCost: 2, parallelism: 1 });
  }

  /** Also takes its time where there is no such account, so that the answer's delay tells nothing. */
  async verify(stored: string | null, password: string): Promise<boolean> {
    const against = stored ?? (await this.decoy());
    const matches = await verify(against, password).catch(() => false);
    return matches && stored !== null;
  }

  private decoyHash: Promise<string> | null = null;
  private decoy(): Promise<string> {
    this.decoyHash ??= this.hash('no account has this password');
    return this.decoyHash;
  }
}
