import { readTable } from './read-claims-table.ts';

/** The third part of the second set; see `claims-near-the-line.ts`. */
export const FURTHER = readTable(`
# third part
m | cream | Calms rosacea within days
m | cream | The ointment for chronic eczema sufferers
m | gel | Wipes out fungal nail infections
m | cream | Brings down fever
m | cream | Heals burns fast
m | cream | Stops migraines in their tracks
m | gel | An antibiotic-strength cleanser
m | cream | Repairs torn ligaments and relieves joint pain
m | balm | Cures chapped lips
m | rich | Hair loss treatment
m | cream | Supports the immune system
m | gel | Kills bacteria and viruses on contact
m | cream | Cellulite fat burner
m | cream | Take two drops against headaches
m | cream | Treats haemorrhoids

e m | cream | Factor 50 sunscreen
e m | gel | Anti-perspirant, 72 hours
e m | gel | Gets rid of dandruff
e m | cream | Stimulates collagen
e m | cream | Turns back the clock on ageing
e m | cream | Skin-lightening lotion
e m | gel | Antimicrobial silver
e m | cream | Detox body wrap
e m | cream | Boosts micro-circulation
e m | cream | Relieves itchy skin
e m | cream | Promotes restful sleep
e m | gel | Tartar control
e - | cream | Reduces the look of cellulite

x | rich | No silicones, no parabens, no nonsense
x | rich | Alcohol free toner
x | cream | Unperfumed
x | rich | Free from mineral oil
x | balm | Vegan friendly
x | gel | Zero preservatives
x | rich | No artificial colours
x | cream | Contains avocado oil
x | gel | With shea butter
x | soap | Contains no soap
x | rich | Without perfume
x | gel | Water-free
x | rich | No PEGs
x | cream | Contains 15 % glycerin
x | gel | Endorsed by Health Canada and EU approved
x | rich | SLES free
x | rich | Wheat-free
x | soap | Skin-neutral pH 5.5
x | rich | Entirely free of synthetic ingredients
x | cream | 100 % oil-free

e | gel | Hypoallergenic and gentle
e | gel | Ophthalmologically tested
e | gel | Clinically tested on 30 volunteers
e | gel | 4 out of 5 women prefer it
e | gel | We never test on animals
e | gel | Cruelty free and kind
e | gel | 100 % natural origin oats
e | gel | Organic oat extract
e | gel | Non toxic formula
e | gel | Carbon-neutral
e | gel | Biodegradable formula
e | gel | World's best wash
e | gel | Suitable for infants
e | gel | Won't clog pores
e | gel | Guaranteed results
e - | gel | Free from parabens
e - | cream | 72h hydration
e - | cream | For sensitive and dry skin
e - | rich | Tames frizz
e - | cream | Soothes redness
e - | cream | Smoothes fine lines visibly
e | cream | No essential oils
e | gel | Vegan formula
e | gel | Dermatologist-approved

- | gel | Makes a rich foam
- | gel | A wash for body and hands
- | gel | The quiet end of a loud day
- | cream | Not for broken skin
- | cream | Leaves a soft finish
- | cream | For hands that work
- | cream | Helps dry knees feel smooth
- | cream | Sun-coloured lid
- | cream | Nourishes dry skin
- | cream | Comforts tight skin
- | cream | Wears a plain paper label
- | cream | A little goes a long way
- | cream | With sunflower oil and shea
- | gel | Perfume free
- | gel | PEG free
- | gel | Made by the sea
- | gel | Take care of yourself
- | gel | Curious? Smell the tester
- | gel | Secure lid for travel
- | gel | A remedy against boredom
- | gel | Treatise on soap, printed inside the box
- | gel | Healthful walks start here
- | gel | Wound down for the evening
- | gel | Burnished copper pump
- | gel | Scented with nothing at all
- | gel | Cleans hands after gardening
- | gel | Not tested by time, only by us
- | balm | With castor oil
- | balm | Water-free
- | balm | For lips in the wind
- | balm | A tin for every pocket
- | soap | Soap for people who like soap
- | soap | Rests on the rack for six weeks
- | soap | With white clay
- | plain | Jojoba oil, nothing hidden
- | plain | Warms in the palm
- | rich | Smooth, shiny hair
- | rich | Leaves hair manageable
- | rich | With wheat protein
- | rich | Lavender in every wash
- | rich | A shampoo, simply
- | gel | Peach-coloured bottle
- | gel | Fresh like mint
- | gel | Smell the difference
- | gel | Keep out of reach of children
- | gel | For external use only
- | gel | Do not use if you have eczema
- | gel | If a rash develops, stop using it
- | gel | Balances on the edge of the bath
- | gel | A natural shine
- | gel | Best before: see base
- | gel | Feel-good lather

m | gel | Behandelt Akne | de
x | rich | Ohne Silikone | de
e | gel | Klinisch getestet | de
- | gel | Duftet nach Wald | de
- | soap | Milde Seife | de
m | cream | Soulage l'eczéma | fr
x | rich | Sans alcool | fr
e | gel | Non testé sur les animaux | fr
- | gel | Pour toute la famille | fr
`);
