import { readTable } from './read-claims-table.ts';

/**
 * A second set, more of it near the line. Judged once before the words of the tables were settled,
 * its first part gave 90.9 % precision and 89.0 % recall, its second 91.9 % and
 * 87.2 %, its third 94.5 % and 91.9 %; since then it has been worked with as well. Columns
 * and reading as in `claims-table.ts`.
 */
export const NEAR_THE_LINE = readTable(`
# medicinal everywhere
m | gel | Clears up eczema in a week
m | gel | Relieves psoriasis and dry patches
m | cream | A natural remedy for aching joints
m | cream | Takes away muscle pain
m | gel | Antifungal foot wash
m | cream | Speeds up wound healing
m | cream | Helps cure dermatitis
m | gel | Fights infection
m | cream | Treats nappy rash
m | rich | Stimulates hair growth
m | rich | Stops hair loss
m | cream | Anti-inflammatory
m | gel | Kills 99.9 % of germs
m | cream | Boosts your immune system
m | cream | Melts away fat
m | plain | Heals scars
m | gel | For the treatment of acne
m | balm | Cold sore relief
m | cream | The arthritis cream our customers swear by
m | balm | Medicated lip balm

# the drug line of the United States and Canada
e m | cream | SPF 15
e m | cream | With built-in sun protection
e m | gel | Anti-dandruff
e m | cream | 48h antiperspirant
e m | cream | Stimulates the production of collagen
e m | cream | Reduces wrinkles
e m | cream | Fades dark spots
e m | gel | Antibacterial
e m | cream | Erases stretch marks
e m | cream | Improves blood circulation

# contradicted by what is in it
x | rich | Silicone free
x | rich | Paraben-free formula
x | rich | No sulphates
x | rich | 0 % alcohol
x | balm | 100% vegan
x | cream | Fragrance free
x | rich | Unscented
x | rich | Free from mineral oils, parabens and silicones
x | gel | Preservative-free
x | cream | Contains argan oil
x | gel | With real aloe vera
x | rich | Without artificial colours or almond
x | gel | Made without water
x | rich | EDTA-free
x | soap | Soap-free
x | balm | Oil-free
x | rich | Gluten-free
x | gel | FDA approved
x | gel | Chemical-free
x | soap | pH 5.5
x | rich | 100 % natural

# to be shown
e | gel | Hypoallergenic
e | gel | Dermatologist tested
e | gel | Clinically proven to soften skin
e | gel | 92 % of users felt a difference
e | gel | Cruelty-free
e | gel | 95 % natural origin
e | gel | Made with organic oats
e | gel | Non-toxic
e | gel | Safe for babies
e | gel | Non-comedogenic
e | gel | The best body wash in the world
e | gel | Eco-friendly
e | gel | Vegan
e - | gel | Paraben-free
e - | cream | 24-hour hydration
e - | gel | For sensitive skin
e - | cream | Strengthens the skin barrier
e | cream | Phthalate-free

# innocent
- | gel | Leaves skin feeling soft
- | gel | Soothes the senses
- | gel | Treat yourself to a quiet evening
- | gel | We acknowledge our growers
- | cream | For cracked heels
- | cream | A treat for tired feet
- | cream | Healthy-looking skin
- | gel | Gently cleanses without stripping
- | cream | Rich and creamy
- | cream | Softens and smooths
- | gel | With oat extract
- | balm | With beeswax and coconut oil
- | gel | Not a medicine
- | gel | Does not treat or cure any disease
- | rich | With sweet almond oil
- | rich | Adds shine
- | gel | A fresh start to the day
- | plain | With jojoba oil
- | plain | Silicone-free
- | gel | Sulfate-free
- | gel | Soap-free cleansing
- | gel | Mineral oil free
- | balm | Waterless
- | gel | Fragrance-free
- | cream | Pampers dry hands
- | gel | Lathers well in hard water
- | gel | Made in small batches
- | gel | Refreshes mind and mood
- | cream | Sinks in without a greasy film
- | gel | A shower you look forward to
- | gel | No fuss
- | gel | Free delivery on two bottles
- | gel | Refill it at our shop
- | balm | Keeps lips supple
- | cream | Warm scent of vanilla and cedar
- | gel | Painstakingly made by hand
- | soap | Cures for six weeks before we cut it
- | gel | The cure for a dull morning is a walk, not soap
- | gel | Rinse well
- | rich | Detangles
- | gel | A burst of energy for your morning shower
- | gel | Poured in our own works
- | plain | Silky feel
- | cream | Moisturises
- | gel | Shake well before use
- | gel | Scarcely any scent
- | cream | Infectious good mood
- | cream | Feels like silk
- | gel | Pharmacy bottle with a pump
- | gel | Cotton-soft lather
- | cream | Wounded knees need a plaster, not this

# German and French
m | gel | Heilt Ekzeme | de
x | rich | Parabenfrei | de
e | gel | Dermatologisch getestet | de
- | gel | Pflegt die Haut | de
- | gel | Für ein heiles Hautgefühl | de
m | gel | Soigne l’eczéma | fr
x | rich | Sans parabènes ni silicones | fr
e | gel | Testé dermatologiquement | fr
- | gel | Laisse la peau douce | fr
- | gel | Un soin du quotidien | fr

# second part
# medicinal everywhere
m | cream | Our grandmother's ointment for stubborn eczema
m | gel | Say farewell to psoriasis flare-ups
m | cream | Eases the pain of arthritis
m | gel | Gets rid of athlete's foot in ten days
m | cream | Promotes the healing of small cuts
m | cream | Natural painkiller
m | gel | Antiseptic and antiviral
m | cream | Rub on the chest to treat bronchitis
m | rich | Makes thinning hair regrow
m | cream | Fat-burning body wrap
m | balm | Prevents cold sores from coming back
m | cream | Reduces swelling and bruising
m | gel | Destroys viruses on the skin
m | cream | Protects against skin cancer
m | gel | Medicinal tar wash for scalp psoriasis
m | cream | Rebalances your hormones

# the drug line
e m | cream | Day cream with SPF 20
e m | cream | Shields skin from UV rays
e m | gel | Keeps dandruff away
e m | cream | Cuts underarm sweating by half
e m | cream | Encourages elastin and collagen synthesis
e m | cream | Fills in deep wrinkles
e m | cream | Lightens dark spots and freckles
e m | gel | Anti-bacterial wash
e m | cream | Firms and banishes cellulite
e m | cream | Draws out toxins
e m | cream | Gets the blood flow going
e m | gel | Helps you fall asleep faster
e - | cream | Visibly reduces fine lines
e - | cream | Minimises the appearance of stretch marks

# contradicted
x | rich | Contains neither parabens nor mineral oil
x | rich | Zero silicones
x | rich | Made without any sulfates
x | cream | Not scented: free of perfume
x | balm | A vegan lip balm
x | rich | Colour-free
x | rich | Never any alcohol
x | cream | With pure lavender oil
x | balm | Enriched with aloe vera and mango butter
x | gel | Contains cocoa butter
x | soap | Not a soap: entirely soap-free
x | gel | No preservatives, ever
x | rich | Almond-free
x | cream | Made with 30 % shea butter
x | gel | This product is approved by Health Canada
x | gel | Absolutely no chemicals
x | soap | pH-neutral
x | balm | Contains no beeswax
x | rich | Petroleum-free
x | rich | 100 % plant-based
x | cream | Oil-free moisture
x | gel | Rose-water wash

# to be shown
e | gel | Tested by dermatologists
e | gel | Hypo-allergenic formula
e | gel | Three times more effective
e | gel | 87 % agreed their skin felt softer
e | gel | Never tested on animals
e | gel | 99 % natural ingredients
e | gel | Certified organic oats
e | gel | Toxin-free
e | gel | Gentle enough for newborns
e | gel | Will not clog pores
e | gel | Cleaner than any other wash
e | gel | Sustainable
e | gel | Made in England
xe x | gel | Without phenoxyethanol or parabens, for calm skin
e - | cream | Keeps skin hydrated for 48 hours
e - | cream | For very sensitive skin
e - | rich | Strengthens hair from root to tip
e - | rich | Repairs split ends
e - | cream | Instantly radiant
x | cream | Free from allergens
e | gel | Suitable during pregnancy
e | gel | Loved by dermatologists
e | gel | Kind to the planet

# innocent
- | gel | Wash, rinse, carry on
- | gel | A scent-free start, naturally quiet
- | gel | Treats for the whole household
- | gel | Healed is what a pot is when the glaze closes; ours holds soap
- | cream | Rough elbows become smooth
- | cream | Comforting after washing up
- | cream | Creamy texture that sinks in
- | cream | Gives dry hands a rest
- | cream | Softens cuticles
- | cream | Rich in shea butter
- | gel | No parrots were bothered
- | gel | Free samples in our shop
- | gel | Apply to wet skin and rinse
- | gel | Store below 25 degrees
- | gel | Not for internal use
- | gel | If irritation occurs, stop use
- | gel | Avoid contact with eyes
- | gel | Consult a doctor if swallowed
- | gel | Smells of juniper and cut grass
- | cream | The smell of roses after rain
- | cream | Fragrance inspired by cedar woods
- | balm | Coconut and shea for dry lips
- | balm | Beeswax makes it firm
- | soap | Hard bar, soft lather
- | soap | Aged for two months
- | soap | Cut and stamped by hand
- | plain | Jojoba and rosehip
- | plain | Just two oils
- | plain | Leaves no greasy film
- | gel | Colour-free
- | gel | A pump gives one dose
- | gel | Bottle designed to last
- | cream | Sealed with a paper band
- | cream | Pleasant to use morning and evening
- | rich | Leaves hair glossy
- | rich | For long, fine hair
- | rich | Rinses clean
- | rich | Sweet almond oil softens the ends
- | gel | With oats
- | gel | Mild foam
- | gel | Fits in hand luggage
- | gel | Your skin will thank you
- | cream | This cream does not heal or cure
- | cream | It is not a sunscreen
- | cream | A cream, not a miracle
- | gel | Scarlet label, plain contents
- | gel | Painting of the weir by a local artist
- | gel | Health shops welcome
- | gel | A calming moment
- | gel | For tired feet after a hike
- | balm | Healthy shine for lips
- | cream | Helps skin feel comfortable
- | soap | Palm-sized bar

# German and French
m | cream | Gegen Neurodermitis und Akne | de
m | gel | Lindert Schmerzen | de
x | rich | Frei von Silikonen | de
e | gel | Natürlich und nachhaltig | de
- | gel | Reinigt sanft | de
- | cream | Mit Sheabutter | de
m | cream | Contre l'eczéma | fr
x | rich | Sans silicone | fr
e | gel | Cliniquement prouvé | fr
- | gel | Parfume délicatement la peau | fr
- | cream | Au beurre de karité | fr
`);
