import { eq } from 'drizzle-orm';
import type { Database } from './client';
import { yards, type Yard } from './schema';

/** Every yard of this installation. */
export function allYards(db: Database): Promise<Yard[]> {
	return db.select().from(yards).orderBy(yards.id);
}

/** A yard by its id; null without one. */
export async function yardById(db: Database, id: string): Promise<Yard | null> {
	const [yard] = await db.select().from(yards).where(eq(yards.id, id));
	return yard ?? null;
}
