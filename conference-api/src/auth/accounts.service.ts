import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager } from 'typeorm';
import { Person } from '../people/entities/person.entity.js';
import { normaliseEmail } from './secrets.js';

/** A person with the hash of the password, which no other query reads. */
@Injectable()
export class AccountsService {
  constructor(private readonly dataSource: DataSource) {}

  async findByEmail(email: string): Promise<Person | null> {
    const wanted = normaliseEmail(email);
    const person = await this.withHash(this.dataSource.manager).where('person.email = :wanted', { wanted }).getOne();
    // the database takes é for e: another spelling must be nobody, or each would have its own count of attempts
    return person?.email === wanted ? person : null;
  }

  findById(id: string): Promise<Person | null> {
    return this.withHash(this.dataSource.manager).where('person.id = :id', { id }).getOne();
  }

  /** Held until the transaction ends, so that a new password and a new session come one after the other. */
  lock(manager: EntityManager, id: string): Promise<Person | null> {
    return this.withHash(manager).where('person.id = :id', { id }).setLock('pessimistic_write').getOne();
  }

  private withHash(manager: EntityManager) {
    return manager.createQueryBuilder(Person, 'person').addSelect('person.passwordHash');
  }
}
