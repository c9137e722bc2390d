module brinefront

go 1.26
