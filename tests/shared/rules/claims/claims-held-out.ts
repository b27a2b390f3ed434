import { readTable } from './read-claims-table.ts';

/**
 * Claims that the words of the tables were never fitted to: written after those were settled, and
 * measured as they are. What is missed here stays missed. Columns and reading as in
 * `claims-table.ts`.
 */
export const HELD_OUT = readTable(`
m | cream | An end to nappy rash
m | cream | Balm for rheumatic joints
m | cream | Combats fungal infections
m | gel | Acne wash for teenagers
m | cream | Speeds the healing of scratches
m | cream | Pain-free periods
m | gel | Antifungal tea tree wash
m | cream | Treats dermatitis in dogs and people
m | rich | Fights hair loss
m | cream | Prevents infection
m | gel | Destroys germs
m | cream | For relief from sciatica
m | balm | Healing lip ointment

e m | cream | SPF50
e m | cream | Protects from sunburn-causing UVB
e m | gel | Antidandruff wash
e m | gel | Controls perspiration
e m | cream | Increases collagen production
e m | cream | Smooths away wrinkles
e m | cream | Reduces hyperpigmentation
e m | cream | Renews cells
e m | cream | Eliminates stretch marks
e m | gel | Anticavity paste
e m | cream | Relieves stress and tension
e - | cream | Softens the look of crow's feet
e - | cream | For a younger look

x | rich | Free of silicones
x | rich | No parabens and no sulphates
x | rich | Paraben & silicone free
x | rich | No denatured alcohol
x | cream | Fragrance-free for quiet noses
x | rich | Contains no colourants
x | balm | Certified vegan
x | gel | Made without preservatives
x | cream | With rosehip oil
x | cream | Enriched with collagen
x | gel | Contains honey
x | soap | Soapless
x | soap | pH-balanced for skin
x | rich | Gluten free
x | cream | Water-free balm
x | rich | Mineral oil-free and petrolatum-free
x | gel | Argan Oil wash
x | gel | Chemical free
x | cream | 25 % sunflower oil
x | rich | Completely natural

e | gel | Hypoallergenic wash
e | gel | Dermatologically approved
e | gel | Proven results
e | gel | 8 in 10 users recommend it
e | gel | No animal testing
e | gel | Naturally derived
e | gel | Made from organic plants
e | gel | Nontoxic
e | gel | For babies and toddlers
e | gel | Noncomedogenic
e | gel | The number one wash
e | gel | Environmentally friendly
e | gel | Kids love it and it is safe for them
e - | gel | Zero parabens
e - | cream | Long-lasting moisture
e - | cream | Gentle on sensitive skin
e - | rich | Repairs damaged ends
e - | cream | Firmer-feeling skin
e - | cream | Protects the skin barrier
e | cream | Hormone-disruptor free
e | gel | GMO free
e | gel | Clinically shown to soften
e | gel | Tested under dermatological control

- | gel | A wash that minds its manners
- | gel | Rich lather, light scent of nothing
- | gel | Made for morning people
- | cream | Soft hands at the end of the shift
- | cream | Cushions rough knuckles
- | cream | For dry shins
- | cream | Reassuringly plain
- | cream | Conditions and softens
- | cream | Paintbrush-thin nozzle
- | cream | Warm it between the palms
- | cream | Heel cream
- | cream | Keeps hands comfortable
- | cream | Does not cure anything but boredom
- | cream | We make no medical claims
- | cream | Contains shea butter
- | cream | 5 % shea butter
- | cream | Alcohol free
- | cream | Paraffin-free
- | cream | For faces that see weather
- | gel | Not fragranced
- | gel | Contains oats
- | gel | Dye free
- | gel | Silicone and sulphate free
- | gel | Save water: wash with a friend
- | gel | Do not swallow
- | gel | Rinse eyes at once if it gets in
- | gel | A wash with a sense of place
- | gel | Curing boredom since spring
- | gel | Bacteria grow in open jars, so we use a pump
- | gel | Treats you well
- | gel | Acre of wild flowers sown for each batch
- | gel | Spotless bathrooms start here
- | gel | Sunday evening in a bottle
- | gel | Hair and body
- | balm | Contains beeswax
- | balm | No water in it
- | balm | Glides on
- | balm | Tinted by nothing but the oils
- | balm | Paraben-less by nature is no claim of ours
- | soap | A soap for gardeners
- | soap | Contains clay
- | soap | Lasts well if kept dry
- | plain | Rosehip and jojoba oil
- | plain | Use two drops
- | plain | Skin feels supple
- | rich | Lavender shampoo
- | rich | With lavender oil
- | rich | Gives body and shine
- | rich | Combs through easily
- | rich | Washes out styling products
- | gel | Healthy habits start small
- | gel | For skin that is easily bored
- | gel | Our best-kept secret is plain soap
- | gel | Bottled in the old pharmacy

m | gel | Gegen Schuppenflechte | de
x | rich | Alkoholfrei | de
e | gel | Tierversuchsfrei | de
- | gel | Angenehmer Schaum | de
m | cream | Guérit les plaies | fr
x | rich | Sans silicones | fr
e | gel | Hypoallergénique et doux | fr
- | gel | Mousse légère | fr
`);
