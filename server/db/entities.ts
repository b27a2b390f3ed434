import { ProductEvidence } from '#server/modules/evidence/evidence.entity.ts';
import { House } from '#server/modules/house/house.entity.ts';
import { Membership } from '#server/modules/house/membership.entity.ts';
import { Person } from '#server/modules/house/person.entity.ts';
import { MaterialDocument } from '#server/modules/materials/material-document.entity.ts';
import { HousePicture } from '#server/modules/pictures/picture.entity.ts';
import { Material } from '#server/modules/materials/material.entity.ts';
import { ProductMaterial } from '#server/modules/products/product-material.entity.ts';
import { ProductRevision } from '#server/modules/products/product-revision.entity.ts';
import { Product } from '#server/modules/products/product.entity.ts';

/** Every table that the mapper reads; sign-in and dictionary tables are read by SQL of their own. */
export const ENTITIES = [House, Person, Membership, Material, MaterialDocument, Product, ProductMaterial, ProductRevision, ProductEvidence, HousePicture];
