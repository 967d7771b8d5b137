import { Injectable } from '@nestjs/common';
import type { OpenItemDto } from '@mantlet/common';

/** What keeps a schedule from being prepared or deserves a look, and who must act. */
@Injectable()
export class OpenItemsService {
  /** Blockers first, in the order of who must act; at most 500 member ids an item, `count` says how many there are. */
  async openItems(_projectId: string): Promise<OpenItemDto[]> {
    return [];
  }
}
