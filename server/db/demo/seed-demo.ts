import type { EntityManager } from '@mikro-orm/postgresql';
import type { House as HouseShape } from '#shared/contracts/house.contract.ts';
import type { MaterialFields } from '#shared/contracts/materials.contract.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { BRACKENMERE, BRAM, DEMO_HOUSES, DEMO_PEOPLE, INES, OTTERBY, type DemoHouse, type DemoPerson } from '#server/local/demo-people.ts';
import { inHouse } from '#server/db/in-house.ts';
import { House } from '#server/modules/house/house.entity.ts';
import { Material } from '#server/modules/materials/material.entity.ts';
import { toMaterialColumns } from '#server/modules/materials/materials.service.ts';
import { keepRevision, keepUses } from '#server/modules/products/keep-save.ts';
import { Product } from '#server/modules/products/product.entity.ts';
import { toProductColumns } from '#server/modules/products/products.service.ts';
import { demoId } from './demo-id.ts';
import { DEMO_MATERIALS, type DemoMaterial } from './demo-materials.ts';
import { DEMO_PRODUCTS } from './demo-products.ts';
import { DEMO_PARTIES, demoMaterialId } from './draft-parts.ts';
import { OTTERBY_MATERIAL, OTTERBY_PRODUCT } from './otterby.ts';

type Particulars = Pick<HouseShape, 'responsiblePerson' | 'usContact' | 'canadaContact' | 'countryOfOrigin' | 'temperatureUnit'>;

const PARTICULARS: Readonly<Record<string, Particulars>> = {
  [BRACKENMERE.id]: {
    responsiblePerson: DEMO_PARTIES,
    usContact: 'hello@brackenmere.example',
    canadaContact: 'hello@brackenmere.example',
    countryOfOrigin: 'Exampleland',
    temperatureUnit: 'C',
  },
  [OTTERBY.id]: {
    responsiblePerson: { EU: { name: 'Otterby Still Room', address: '1 Mill Lane, 0000 Exampleford' } },
    usContact: '',
    canadaContact: '',
    countryOfOrigin: 'Exampleland',
    temperatureUnit: 'C',
  },
};

/** Adds the invented houses with their people, materials and products where they are not there yet. */
export async function seedDemo(em: EntityManager, issuer: string, now = new Date()): Promise<void> {
  for (const person of DEMO_PEOPLE) await keepPerson(em, person, issuer, now);
  for (const house of DEMO_HOUSES) {
    await inHouse(em, house.id, async (own) => {
      await keepHouse(own, house, now);
      if (house.id === OTTERBY.id) {
        await keepMaterial(own, { house, by: BRAM, now }, OTTERBY_MATERIAL.id, OTTERBY_MATERIAL.fields);
        await keepProduct(own, { house, by: BRAM, now }, OTTERBY_PRODUCT.id, OTTERBY_PRODUCT.draft);
        return;
      }
      for (const [key, fields] of Object.entries(DEMO_MATERIALS)) await keepMaterial(own, { house, by: INES, now }, demoMaterialId(key as DemoMaterial), fields);
      // One minute apart, so that the shelf stands in the order of the list.
      for (const [index, draft] of DEMO_PRODUCTS.entries()) {
        await keepProduct(own, { house, by: INES, now: new Date(now.getTime() - index * 60_000) }, demoId(`product ${draft.name}`), draft);
      }
    }, { actor: { personId: null, name: 'Set-up of the demo' }, now: () => now });
  }
}

/** The identity service's address may have changed since the last start; the person has not. */
async function keepPerson(em: EntityManager, person: DemoPerson, issuer: string, now: Date): Promise<void> {
  await em.fork().execute(
    `insert into person (id, issuer, subject, name, email, created_at) values (?, ?, ?, ?, ?, ?)
     on conflict (id) do update set issuer = excluded.issuer, subject = excluded.subject`,
    [person.id, issuer, person.id, person.name, person.email, now],
  );
}

async function keepHouse(em: EntityManager, house: DemoHouse, now: Date): Promise<void> {
  const particulars = PARTICULARS[house.id];
  if (!particulars) throw new Error(`the demo house ${house.name} has no particulars`);
  if (!(await em.findOne(House, { id: house.id }))) {
    em.create(House, { id: house.id, name: house.name, brand: house.name, particulars, createdAt: now });
    await em.flush();
  }
  for (const person of DEMO_PEOPLE.filter((one) => one.houseId === house.id)) {
    await em.execute('insert into membership (house_id, person_id, roles) values (?, ?, ?::text[]) on conflict do nothing', [house.id, person.id, `{${person.roles.join(',')}}`]);
  }
}

interface Save {
  readonly house: DemoHouse;
  readonly by: DemoPerson;
  readonly now: Date;
}
const savedBy = ({ by, now }: Save) => ({ savedAt: now, savedById: by.id, savedBy: by.name });

async function keepMaterial(em: EntityManager, save: Save, id: string, fields: MaterialFields): Promise<void> {
  if (await em.findOne(Material, { id })) return;
  em.create(Material, { id, houseId: save.house.id, ...toMaterialColumns(fields), ...savedBy(save) });
  await em.flush();
}

async function keepProduct(em: EntityManager, save: Save, id: string, draft: ProductDraft): Promise<void> {
  if (await em.findOne(Product, { id })) return;
  const product = em.create(Product, { id, houseId: save.house.id, version: 1, ...toProductColumns(draft), ...savedBy(save) });
  await em.flush();
  await keepUses(em, product);
  await keepRevision(em, product);
}
