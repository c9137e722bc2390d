package ref

// The sources, by ID. Add here, cite everywhere else.
const (
	AbramowitzStegun1964 ID = "abramowitz-stegun-1964"
	Ahmed2001            ID = "ahmed-2001"
	Alexander1977        ID = "alexander-1977"
	Amott1959            ID = "amott-1959"
	ArcherWall1986       ID = "archer-wall-1986"
	Aronofsky1958        ID = "aronofsky-1958"
	Bertsekas1982        ID = "bertsekas-1982"
	BatzleWang1992       ID = "batzle-wang-1992"
	BrooksCorey1964      ID = "brooks-corey-1964"
	BuckleyLeverett1942  ID = "buckley-leverett-1942"
	Chandrupatla1997     ID = "chandrupatla-1997"
	Chaudhry2004         ID = "chaudhry-2004"
	Corey1954            ID = "corey-1954"
	Craig1971            ID = "craig-1971"
	CraigGeffenMorse1955 ID = "craig-geffen-morse-1955"
	CrandallMajda1980    ID = "crandall-majda-1980"
	Cuiec1984            ID = "cuiec-1984"
	Dake1978             ID = "dake-1978"
	DawsonLantz1972      ID = "dawson-lantz-1972"
	DeSwaan1978          ID = "de-swaan-1978"
	Deppe1961            ID = "deppe-1961"
	Dietz1953            ID = "dietz-1953"
	Donaldson1969        ID = "donaldson-1969"
	DyesCaudle1954       ID = "dyes-caudle-erickson-1954"
	DykstraParsons1950   ID = "dykstra-parsons-1950"
	Fanchi2016           ID = "fanchi-christiansen-2016"
	Fassihi1986          ID = "fassihi-1986"
	Fayers1962           ID = "fayers-1962"
	FritschCarlson1980   ID = "fritsch-carlson-1980"
	Godunov1959          ID = "godunov-1959"
	GolubVanLoan2013     ID = "golub-van-loan-2013"
	Hearn1971            ID = "hearn-1971"
	HigginsLeighton1962  ID = "higgins-leighton-1962"
	Hovdan1986           ID = "hovdan-1986"
	IAPWSIF97            ID = "iapws-if97"
	IAPWSR12             ID = "iapws-r12-08"
	Jenny2009            ID = "jenny-2009"
	JohansenWinther1988  ID = "johansen-winther-1988"
	Kazemi1976           ID = "kazemi-1976"
	Kazemi1992           ID = "kazemi-gilman-elsharkawy-1992"
	KreftZuber1978       ID = "kreft-zuber-1978"
	KyteBerry1975        ID = "kyte-berry-1975"
	Kuznetsov1976        ID = "kuznetsov-1976"
	Lake1989             ID = "lake-1989"
	Land1968             ID = "land-1968"
	LeVeque2002          ID = "leveque-2002"
	Leverett1941         ID = "leverett-1941"
	Levenberg1944        ID = "levenberg-1944"
	LimAziz1995          ID = "lim-aziz-1995"
	Lo1990               ID = "lo-warner-johnson-1990"
	Lomeland2005         ID = "lomeland-2005"
	MaMorrowZhang1997    ID = "ma-morrow-zhang-1997"
	Marquardt1963        ID = "marquardt-1963"
	MattaxKyte1962       ID = "mattax-kyte-1962"
	McCain1991           ID = "mccain-1991"
	McPhee2015           ID = "mcphee-2015"
	McWhorterSunada1990  ID = "mcwhorter-sunada-1990"
	More1978             ID = "more-1978"
	MorelSeytoux1966     ID = "morel-seytoux-1966"
	Muskat1937           ID = "muskat-1937"
	Neumaier1974         ID = "neumaier-1974"
	NISTStRD             ID = "nist-strd"
	Nielsen1999          ID = "nielsen-1999"
	NISTSP811            ID = "nist-sp-811"
	OgataBanks1961       ID = "ogata-banks-1961"
	Oleinik1957          ID = "oleinik-1957"
	Osher1984            ID = "osher-1984"
	Peaceman1978         ID = "peaceman-1978"
	PerthameShu1996      ID = "perthame-shu-1996"
	Perry2019            ID = "perry-2019"
	Philip1960           ID = "philip-1960"
	Phillips1981         ID = "phillips-1981"
	Pope1980             ID = "pope-1980"
	RapoportLeas1953     ID = "rapoport-leas-1953"
	Prats1956            ID = "prats-1956"
	Roe1986              ID = "roe-1986"
	SaffmanTaylor1958    ID = "saffman-taylor-1958"
	SchmidGeiger2012     ID = "schmid-geiger-2012"
	SchmalzRahme1950     ID = "schmalz-rahme-1950"
	SeberWild1989        ID = "seber-wild-1989"
	ShuOsher1988         ID = "shu-osher-1988"
	Skjaeveland2000      ID = "skjaeveland-2000"
	Stiles1949           ID = "stiles-1949"
	Stone1991            ID = "stone-1991"
	Sweby1984            ID = "sweby-1984"
	TakahasiMori1974     ID = "takahasi-mori-1974"
	VanGenuchten1980     ID = "van-genuchten-1980"
	VanLeer1974          ID = "van-leer-1974"
	VanLeer1979          ID = "van-leer-1979"
	WarrenRoot1963       ID = "warren-root-1963"
	Welge1952            ID = "welge-1952"
	Willhite1986         ID = "willhite-1986"
	Wright1997           ID = "wright-1997"
)

var sources = map[ID]Source{
	AbramowitzStegun1964: {Authors: "Abramowitz & Stegun", Year: 1964, Title: "Handbook of Mathematical Functions", Where: "National Bureau of Standards, table 25.4"},
	Ahmed2001:            {Authors: "Ahmed", Year: 2001, Title: "Reservoir Engineering Handbook", Where: "2nd ed., Gulf Professional Publishing"},
	Alexander1977:        {Authors: "Alexander", Year: 1977, Title: "Diagonally implicit Runge-Kutta methods for stiff O.D.E.'s", Where: "SIAM J. Numer. Anal. 14(6), 1006-1021"},
	Amott1959:            {Authors: "Amott", Year: 1959, Title: "Observations relating to the wettability of porous rock", Where: "Trans. AIME 216, 156-162"},
	ArcherWall1986:       {Authors: "Archer & Wall", Year: 1986, Title: "Petroleum Engineering: Principles and Practice", Where: "Graham & Trotman, London"},
	Aronofsky1958:        {Authors: "Aronofsky, Masse & Natanson", Year: 1958, Title: "A model for the mechanism of oil recovery from the porous matrix due to water invasion in fractured reservoirs", Where: "Trans. AIME 213, 17-19"},
	Bertsekas1982:        {Authors: "Bertsekas", Year: 1982, Title: "Projected Newton methods for optimization problems with simple constraints", Where: "SIAM J. Control Optim. 20(2), 221-246"},
	BatzleWang1992:       {Authors: "Batzle & Wang", Year: 1992, Title: "Seismic properties of pore fluids", Where: "Geophysics 57(11), 1396-1408"},
	BrooksCorey1964:      {Authors: "Brooks & Corey", Year: 1964, Title: "Hydraulic properties of porous media", Where: "Hydrology Paper 3, Colorado State University"},
	Chandrupatla1997:     {Authors: "Chandrupatla", Year: 1997, Title: "A new hybrid quadratic/bisection algorithm for finding the zero of a nonlinear function without using derivatives", Where: "Adv. Eng. Software 28(3), 145-149"},
	Chaudhry2004:         {Authors: "Chaudhry", Year: 2004, Title: "Oil Well Testing Handbook", Where: "Gulf Professional Publishing"},
	DeSwaan1978:          {Authors: "de Swaan", Year: 1978, Title: "Theory of waterflooding in fractured reservoirs", Where: "SPE J. 18(2), 117-122"},
	DykstraParsons1950:   {Authors: "Dykstra & Parsons", Year: 1950, Title: "The prediction of oil recovery by water flood", Where: "Secondary Recovery of Oil in the United States, 2nd ed., API, 160-174"},
	Fanchi2016:           {Authors: "Fanchi & Christiansen", Year: 2016, Title: "Introduction to Petroleum Engineering", Where: "Wiley, eq. 4.23-4.25"},
	Hearn1971:            {Authors: "Hearn", Year: 1971, Title: "Simulation of stratified waterflooding by pseudo relative permeability curves", Where: "J. Pet. Technol. 23(7), 805-813"},
	IAPWSIF97:            {Authors: "IAPWS", Year: 2012, Title: "Revised Release on the IAPWS Industrial Formulation 1997 for the Thermodynamic Properties of Water and Steam", Where: "IAPWS R7-97"},
	IAPWSR12:             {Authors: "IAPWS", Year: 2008, Title: "Release on the IAPWS Formulation 2008 for the Viscosity of Ordinary Water Substance", Where: "IAPWS R12-08"},
	Jenny2009:            {Authors: "Jenny, Tchelepi & Lee", Year: 2009, Title: "Unconditionally convergent nonlinear solver for hyperbolic conservation laws with S-shaped flux functions", Where: "J. Comput. Phys. 228(20), 7497-7512"},
	JohansenWinther1988:  {Authors: "Johansen & Winther", Year: 1988, Title: "The solution of the Riemann problem for a hyperbolic system of conservation laws modeling polymer flooding", Where: "SIAM J. Math. Anal. 19(3), 541-566"},
	Kazemi1976:           {Authors: "Kazemi, Merrill, Porterfield & Zeman", Year: 1976, Title: "Numerical simulation of water-oil flow in naturally fractured reservoirs", Where: "SPE J. 16(6), 317-326"},
	Kazemi1992:           {Authors: "Kazemi, Gilman & Elsharkawy", Year: 1992, Title: "Analytical and numerical solution of oil recovery from fractured reservoirs with empirical transfer functions", Where: "SPE Reserv. Eng. 7(2), 219-227"},
	KreftZuber1978:       {Authors: "Kreft & Zuber", Year: 1978, Title: "On the physical meaning of the dispersion equation and its solutions for different initial and boundary conditions", Where: "Chem. Eng. Sci. 33(11), 1471-1480"},
	Lake1989:             {Authors: "Lake", Year: 1989, Title: "Enhanced Oil Recovery", Where: "Prentice Hall"},
	Land1968:             {Authors: "Land", Year: 1968, Title: "Calculation of imbibition relative permeability for two- and three-phase flow from rock properties", Where: "SPE J. 8(2), 149-156"},
	LeVeque2002:          {Authors: "LeVeque", Year: 2002, Title: "Finite Volume Methods for Hyperbolic Problems", Where: "Cambridge University Press"},
	LimAziz1995:          {Authors: "Lim & Aziz", Year: 1995, Title: "Matrix-fracture transfer shape factors for dual-porosity simulators", Where: "J. Pet. Sci. Eng. 13(3-4), 169-178"},
	Lo1990:               {Authors: "Lo, Warner & Johnson", Year: 1990, Title: "A study of the post-breakthrough characteristics of waterfloods", Where: "SPE 20064"},
	MaMorrowZhang1997:    {Authors: "Ma, Morrow & Zhang", Year: 1997, Title: "Generalized scaling of spontaneous imbibition data for strongly water-wet systems", Where: "J. Pet. Sci. Eng. 18(3-4), 165-178"},
	MattaxKyte1962:       {Authors: "Mattax & Kyte", Year: 1962, Title: "Imbibition oil recovery from fractured, water-drive reservoir", Where: "SPE J. 2(2), 177-184"},
	Muskat1937:           {Authors: "Muskat", Year: 1937, Title: "The Flow of Homogeneous Fluids through Porous Media", Where: "McGraw-Hill"},
	NISTSP811:            {Authors: "Thompson & Taylor", Year: 2008, Title: "Guide for the Use of the International System of Units", Where: "NIST Special Publication 811"},
	OgataBanks1961:       {Authors: "Ogata & Banks", Year: 1961, Title: "A solution of the differential equation of longitudinal dispersion in porous media", Where: "Professional Paper 411-A, U.S. Geological Survey"},
	BuckleyLeverett1942:  {Authors: "Buckley & Leverett", Year: 1942, Title: "Mechanism of fluid displacement in sands", Where: "Trans. AIME 146, 107-116"},
	Corey1954:            {Authors: "Corey", Year: 1954, Title: "The interrelation between gas and oil relative permeabilities", Where: "Producers Monthly 19(1), 38-41"},
	Craig1971:            {Authors: "Craig", Year: 1971, Title: "The Reservoir Engineering Aspects of Waterflooding", Where: "SPE Monograph 3"},
	Cuiec1984:            {Authors: "Cuiec", Year: 1984, Title: "Rock/crude-oil interactions and wettability: an attempt to understand their interrelation", Where: "SPE 13211, 59th Annual Technical Conference, Houston"},
	Dake1978:             {Authors: "Dake", Year: 1978, Title: "Fundamentals of Reservoir Engineering", Where: "Elsevier"},
	DawsonLantz1972:      {Authors: "Dawson & Lantz", Year: 1972, Title: "Inaccessible pore volume in polymer flooding", Where: "SPE J. 12(5), 448-452"},
	Dietz1953:            {Authors: "Dietz", Year: 1953, Title: "A theoretical approach to the problem of encroaching and by-passing edge water", Where: "Proc. Koninkl. Ned. Akad. Wetensch. B 56, 83-92"},
	Donaldson1969:        {Authors: "Donaldson, Thomas & Lorenz", Year: 1969, Title: "Wettability determination and its effect on recovery efficiency", Where: "SPE Journal 9(1), 13-20"},
	Fayers1962:           {Authors: "Fayers", Year: 1962, Title: "Some theoretical results concerning the displacement of a viscous oil by a hot fluid in a porous medium", Where: "J. Fluid Mech. 13(1), 65-76"},
	FritschCarlson1980:   {Authors: "Fritsch & Carlson", Year: 1980, Title: "Monotone piecewise cubic interpolation", Where: "SIAM J. Numer. Anal. 17(2), 238-246"},
	Leverett1941:         {Authors: "Leverett", Year: 1941, Title: "Capillary behavior in porous solids", Where: "Trans. AIME 142, 152-169"},
	Levenberg1944:        {Authors: "Levenberg", Year: 1944, Title: "A method for the solution of certain non-linear problems in least squares", Where: "Quart. Appl. Math. 2(2), 164-168"},
	Marquardt1963:        {Authors: "Marquardt", Year: 1963, Title: "An algorithm for least-squares estimation of nonlinear parameters", Where: "J. SIAM 11(2), 431-441"},
	McCain1991:           {Authors: "McCain", Year: 1991, Title: "Reservoir-fluid property correlations: state of the art", Where: "SPE Reserv. Eng. 6(2), 266-272"},
	McPhee2015:           {Authors: "McPhee, Reed & Zubizarreta", Year: 2015, Title: "Core Analysis: A Best Practice Guide", Where: "Elsevier"},
	McWhorterSunada1990:  {Authors: "McWhorter & Sunada", Year: 1990, Title: "Exact integral solutions for two-phase flow", Where: "Water Resour. Res. 26(3), 399-413"},
	More1978:             {Authors: "Moré", Year: 1978, Title: "The Levenberg-Marquardt algorithm: implementation and theory", Where: "in Watson (ed.) Numerical Analysis, Springer, 105-116"},
	NISTStRD:             {Authors: "National Institute of Standards and Technology", Year: 1998, Title: "Statistical Reference Datasets: nonlinear regression", Where: "NIST Standard Reference Database 140"},
	Nielsen1999:          {Authors: "Nielsen", Year: 1999, Title: "Damping parameter in Marquardt's method", Where: "Report IMM-REP-1999-05, Technical University of Denmark"},
	Lomeland2005:         {Authors: "Lomeland, Ebeltoft & Thomas", Year: 2005, Title: "A new versatile relative permeability correlation", Where: "SCA2005-32"},
	Oleinik1957:          {Authors: "Oleinik", Year: 1957, Title: "Discontinuous solutions of non-linear differential equations", Where: "Uspekhi Mat. Nauk 12(3), 3-73"},
	Perry2019:            {Authors: "Green & Southard (eds.)", Year: 2019, Title: "Perry's Chemical Engineers' Handbook", Where: "9th ed., McGraw-Hill"},
	Philip1960:           {Authors: "Philip", Year: 1960, Title: "General method of exact solution of the concentration-dependent diffusion equation", Where: "Aust. J. Phys. 13, 1-12"},
	Phillips1981:         {Authors: "Phillips, Igbene, Fair, Ozbek & Tavana", Year: 1981, Title: "A technical databook for geothermal energy utilization", Where: "Report LBL-12810, Lawrence Berkeley Laboratory"},
	Pope1980:             {Authors: "Pope", Year: 1980, Title: "The application of fractional flow theory to enhanced oil recovery", Where: "SPE J. 20(3), 191-205"},
	RapoportLeas1953:     {Authors: "Rapoport & Leas", Year: 1953, Title: "Properties of linear waterfloods", Where: "Trans. AIME 198, 139-148"},
	SaffmanTaylor1958:    {Authors: "Saffman & Taylor", Year: 1958, Title: "The penetration of a fluid into a porous medium or Hele-Shaw cell containing a more viscous liquid", Where: "Proc. R. Soc. Lond. A 245, 312-329"},
	SchmidGeiger2012:     {Authors: "Schmid & Geiger", Year: 2012, Title: "Universal scaling of spontaneous imbibition for water-wet systems", Where: "Water Resour. Res. 48, W03507"},
	SchmalzRahme1950:     {Authors: "Schmalz & Rahme", Year: 1950, Title: "The variation in water flood performance with variation in permeability profile", Where: "Producers Monthly 15(9), 9-12"},
	SeberWild1989:        {Authors: "Seber & Wild", Year: 1989, Title: "Nonlinear Regression", Where: "Wiley, ch. 5"},
	WarrenRoot1963:       {Authors: "Warren & Root", Year: 1963, Title: "The behavior of naturally fractured reservoirs", Where: "SPE J. 3(3), 245-255"},
	Stiles1949:           {Authors: "Stiles", Year: 1949, Title: "Use of permeability distribution in water flood calculations", Where: "Trans. AIME 186, 9-13"},
	Welge1952:            {Authors: "Welge", Year: 1952, Title: "A simplified method for computing oil recovery by gas or water drive", Where: "Trans. AIME 195, 91-98"},
	Wright1997:           {Authors: "Wright", Year: 1997, Title: "Primal-Dual Interior-Point Methods", Where: "SIAM, Philadelphia"},
	CrandallMajda1980:    {Authors: "Crandall & Majda", Year: 1980, Title: "Monotone difference approximations for scalar conservation laws", Where: "Math. Comp. 34(149), 1-21"},
	Godunov1959:          {Authors: "Godunov", Year: 1959, Title: "A difference method for numerical calculation of discontinuous solutions of the equations of hydrodynamics", Where: "Mat. Sbornik 47(89)(3), 271-306"},
	GolubVanLoan2013:     {Authors: "Golub & Van Loan", Year: 2013, Title: "Matrix Computations", Where: "4th ed., Johns Hopkins University Press, secs. 4.2, 8.5"},
	Hovdan1986:           {Authors: "Hovdan", Year: 1986, Title: "Water injection: incompressible analytical solution with temperature effects", Where: "Technical Report MH-1/86, Statoil"},
	KyteBerry1975:        {Authors: "Kyte & Berry", Year: 1975, Title: "New pseudo functions to control numerical dispersion", Where: "SPE J. 15(4), 269-276"},
	Stone1991:            {Authors: "Stone", Year: 1991, Title: "Rigorous black oil pseudo functions", Where: "SPE 21207"},
	Kuznetsov1976:        {Authors: "Kuznetsov", Year: 1976, Title: "Accuracy of some approximate methods for computing the weak solutions of a first-order quasi-linear equation", Where: "USSR Comput. Math. Math. Phys. 16(6), 105-119"},
	Neumaier1974:         {Authors: "Neumaier", Year: 1974, Title: "Rundungsfehleranalyse einiger Verfahren zur Summation endlicher Summen", Where: "Z. Angew. Math. Mech. 54(1), 39-51"},
	Osher1984:            {Authors: "Osher", Year: 1984, Title: "Riemann solvers, the entropy condition, and difference approximations", Where: "SIAM J. Numer. Anal. 21(2), 217-235"},
	PerthameShu1996:      {Authors: "Perthame & Shu", Year: 1996, Title: "On positivity preserving finite volume schemes for Euler equations", Where: "Numer. Math. 73(1), 119-130"},
	Roe1986:              {Authors: "Roe", Year: 1986, Title: "Characteristic-based schemes for the Euler equations", Where: "Ann. Rev. Fluid Mech. 18, 337-365"},
	ShuOsher1988:         {Authors: "Shu & Osher", Year: 1988, Title: "Efficient implementation of essentially non-oscillatory shock-capturing schemes", Where: "J. Comput. Phys. 77(2), 439-471"},
	Skjaeveland2000:      {Authors: "Skjaeveland, Siqveland, Kjosavik, Hammervold Thomas & Virnovsky", Year: 2000, Title: "Capillary pressure correlation for mixed-wet reservoirs", Where: "SPE Reservoir Evaluation & Engineering 3(1), 60-67"},
	Sweby1984:            {Authors: "Sweby", Year: 1984, Title: "High resolution schemes using flux limiters for hyperbolic conservation laws", Where: "SIAM J. Numer. Anal. 21(5), 995-1011"},
	TakahasiMori1974:     {Authors: "Takahasi & Mori", Year: 1974, Title: "Double exponential formulas for numerical integration", Where: "Publ. Res. Inst. Math. Sci. 9(3), 721-741"},
	VanGenuchten1980:     {Authors: "van Genuchten", Year: 1980, Title: "A closed-form equation for predicting the hydraulic conductivity of unsaturated soils", Where: "Soil Sci. Soc. Am. J. 44(5), 892-898"},
	VanLeer1974:          {Authors: "van Leer", Year: 1974, Title: "Towards the ultimate conservative difference scheme. II. Monotonicity and conservation combined in a second-order scheme", Where: "J. Comput. Phys. 14(4), 361-370"},
	VanLeer1979:          {Authors: "van Leer", Year: 1979, Title: "Towards the ultimate conservative difference scheme. V. A second-order sequel to Godunov's method", Where: "J. Comput. Phys. 32(1), 101-136"},
	CraigGeffenMorse1955: {Authors: "Craig, Geffen & Morse", Year: 1955, Title: "Oil production performance of pattern gas or water injection operations from model tests", Where: "Trans. AIME 204, 7-15"},
	Deppe1961:            {Authors: "Deppe", Year: 1961, Title: "Injection rates: the effect of mobility ratio, area swept, and pattern", Where: "SPE J. 1(2), 81-91"},
	DyesCaudle1954:       {Authors: "Dyes, Caudle & Erickson", Year: 1954, Title: "Oil production after breakthrough as influenced by mobility ratio", Where: "Trans. AIME 201, 81-86"},
	Fassihi1986:          {Authors: "Fassihi", Year: 1986, Title: "New correlations for calculation of vertical coverage and areal sweep efficiency", Where: "SPE Reserv. Eng. 1(6), 604-606"},
	HigginsLeighton1962:  {Authors: "Higgins & Leighton", Year: 1962, Title: "A computer method to calculate two-phase flow in any irregularly bounded porous medium", Where: "J. Pet. Technol. 14(6), 679-683"},
	MorelSeytoux1966:     {Authors: "Morel-Seytoux", Year: 1966, Title: "Unit mobility ratio displacement calculations for pattern floods in homogeneous medium", Where: "SPE J. 6(3), 217-227"},
	Peaceman1978:         {Authors: "Peaceman", Year: 1978, Title: "Interpretation of well-block pressures in numerical reservoir simulation", Where: "SPE J. 18(3), 183-194"},
	Prats1956:            {Authors: "Prats", Year: 1956, Title: "The breakthrough sweep efficiency of a staggered line drive", Where: "Trans. AIME 207, 361-362"},
	Willhite1986:         {Authors: "Willhite", Year: 1986, Title: "Waterflooding", Where: "SPE Textbook Series 3"},
}
